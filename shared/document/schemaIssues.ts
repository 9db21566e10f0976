/** What the schema refused, as issues in plain words: path, what is wrong, found and allowed. */
import type { z } from 'zod'
import type { Issue } from './analysisDocument.ts'
import { describeValue } from './issueWords.ts'

type ZodIssue = z.core.$ZodIssue
type Told = Omit<Issue, 'path'>

/** `section.spirals[0].pitch`; `(document)` for the whole. */
export function toPath(keys: readonly PropertyKey[]): string {
  const path = keys.reduce<string>((text, key) => {
    if (typeof key === 'number') return `${text}[${key}]`
    return text === '' ? String(key) : `${text}.${String(key)}`
  }, '')
  return path === '' ? '(document)' : path
}

/** `document` is what the schema was given: the values that were found stand there. */
export function toIssues(zodIssues: readonly ZodIssue[], document: unknown): Issue[] {
  return zodIssues.flatMap((issue): Issue[] => {
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => {
        const path = [...issue.path, key]
        return { path: toPath(path), ...tellUnknown(findValue(document, path)) }
      })
    }
    // Beyond the whole numbers that are exact, the bound of the field itself is told as well.
    if ('origin' in issue && issue.origin === 'int') return []
    return [{ path: toPath(issue.path), ...tell(issue, findValue(document, issue.path)) }]
  })
}

function tell(issue: ZodIssue, value: unknown): Told {
  switch (issue.code) {
    case 'invalid_type':
      return tellType(value, nameType(issue.expected))
    case 'too_small':
      return tellSize(issue.origin, value, 'too-small', `at least ${issue.minimum}`)
    case 'too_big':
      return tellSize(issue.origin, value, 'too-large', `at most ${issue.maximum}`)
    case 'invalid_value':
      return tellChoice(value, issue.values)
    case 'invalid_union':
      return tellChoice(value, 'options' in issue && Array.isArray(issue.options) ? issue.options : [])
    case 'invalid_key':
      return {
        code: 'bad-name',
        message: 'stands under a name that cannot be used',
        found: describeValue(issue.path.at(-1)),
        allowed: 'a name of 1 to 80 characters without blanks at its ends',
      }
    default:
      return { code: 'invalid', message: issue.message, found: describeValue(value) }
  }
}

function tellUnknown(value: unknown): Told {
  return {
    code: 'unknown-field',
    message: 'is not a field that can stand here',
    found: describeValue(value),
    allowed: 'nothing under this name',
  }
}

function tellType(value: unknown, allowed: string): Told {
  const found = describeValue(value)
  if (value === undefined) return { code: 'missing', message: 'is missing', found, allowed }
  if (typeof value === 'number' && !Number.isFinite(value)) {
    return { code: 'not-finite', message: 'is not a finite number', found, allowed: 'a finite number' }
  }
  return { code: 'wrong-type', message: 'is of the wrong type', found, allowed }
}

function tellChoice(value: unknown, choices: readonly unknown[]): Told {
  const found = describeValue(value)
  const allowed = choices.map(describeValue).join(', ')
  if (value === undefined) return { code: 'missing', message: 'is missing', found, allowed }
  return { code: 'not-allowed', message: 'has a value that is not known', found, allowed }
}

/** Numbers are too small or large by their value, lists and texts by their length. */
function tellSize(origin: string, value: unknown, code: 'too-small' | 'too-large', bound: string): Told {
  const isSmall = code === 'too-small'
  if (typeof value === 'string') {
    const message = isSmall ? 'is too short' : 'is too long'
    return { code, message, found: `${value.length} characters`, allowed: `${bound} characters` }
  }
  if (origin === 'array' && Array.isArray(value)) {
    const message = isSmall ? 'has too few entries' : 'has too many entries'
    return { code, message, found: `${value.length}`, allowed: bound }
  }
  return {
    code,
    message: isSmall ? 'is too small' : 'is too large',
    found: describeValue(value),
    allowed: bound,
  }
}

function findValue(root: unknown, keys: readonly PropertyKey[]): unknown {
  return keys.reduce<unknown>(
    (value, key) =>
      typeof value === 'object' && value !== null && Object.hasOwn(value, key)
        ? (value as Record<PropertyKey, unknown>)[key]
        : undefined,
    root,
  )
}

function nameType(expected: string): string {
  const names: Record<string, string> = {
    number: 'a number',
    int: 'a whole number',
    string: 'text',
    boolean: 'true or false',
    object: 'an object',
    record: 'an object',
    array: 'a list',
    tuple: 'a list [x, y]',
  }
  return names[expected] ?? expected
}
