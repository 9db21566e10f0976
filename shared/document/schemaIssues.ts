/** What the schema refused, as issues in plain words: path, what is wrong, found and allowed. */
import type { z } from 'zod'
import type { Issue } from './analysisDocument.ts'

type ZodIssue = z.core.$ZodIssue

/** `section.spirals[0].pitch`; `(document)` for the whole. */
export function toPath(keys: readonly PropertyKey[]): string {
  const path = keys.reduce<string>((text, key) => {
    if (typeof key === 'number') return `${text}[${key}]`
    return text === '' ? String(key) : `${text}.${String(key)}`
  }, '')
  return path === '' ? '(document)' : path
}

export function toIssues(zodIssues: readonly ZodIssue[], document: unknown): Issue[] {
  return zodIssues.flatMap((issue) => toIssue(issue, document))
}

function toIssue(issue: ZodIssue, document: unknown): Issue[] {
  const path = toPath(issue.path)
  const value = findValue(document, issue.path)
  const found = describe(value)
  switch (issue.code) {
    case 'invalid_type':
      if (value === undefined) {
        return [
          {
            path,
            code: 'missing',
            message: 'is missing',
            found: 'nothing',
            allowed: nameType(issue.expected),
          },
        ]
      }
      if (typeof value === 'number' && !Number.isFinite(value)) {
        return [
          { path, code: 'not-finite', message: 'is not a finite number', found, allowed: 'a finite number' },
        ]
      }
      return [
        {
          path,
          code: 'wrong-type',
          message: 'is of the wrong type',
          found,
          allowed: nameType(issue.expected),
        },
      ]
    case 'too_small':
      return [
        { path, code: 'too-small', message: 'is too small', found: measure(value), allowed: least(issue) },
      ]
    case 'too_big':
      return [
        { path, code: 'too-large', message: 'is too large', found: measure(value), allowed: most(issue) },
      ]
    case 'unrecognized_keys':
      return issue.keys.map((key) => ({
        path: path === '(document)' ? key : `${path}.${key}`,
        code: 'unknown-field',
        message: 'is not a field of the analysis document',
        found: describe(findValue(document, [...issue.path, key])),
        allowed: 'no field of this name here',
      }))
    case 'invalid_value':
      return [
        {
          path,
          code: 'not-allowed',
          message: 'has a value that is not known',
          found,
          allowed: list(issue.values),
        },
      ]
    case 'invalid_union': {
      const allowed =
        'options' in issue && Array.isArray(issue.options) ? list(issue.options) : 'a known kind'
      return value === undefined
        ? [{ path, code: 'missing', message: 'is missing', found: 'nothing', allowed }]
        : [{ path, code: 'not-allowed', message: 'has a value that is not known', found, allowed }]
    }
    default:
      return [{ path, code: 'invalid', message: issue.message, found }]
  }
}

function findValue(root: unknown, keys: readonly PropertyKey[]): unknown {
  return keys.reduce<unknown>(
    (value, key) =>
      typeof value === 'object' && value !== null ? (value as Record<PropertyKey, unknown>)[key] : undefined,
    root,
  )
}

function describe(value: unknown): string {
  if (value === undefined) return 'nothing'
  if (Array.isArray(value)) return `a list of ${value.length}`
  if (typeof value === 'object' && value !== null) return 'an object'
  if (typeof value === 'number') return String(value)
  const text = JSON.stringify(value) ?? typeof value
  return text.length > 60 ? `${text.slice(0, 57)}...` : text
}

/** Lists and texts are too small or large by their length. */
function measure(value: unknown): string {
  if (typeof value === 'string') return `${value.length} characters`
  return describe(value)
}

function least(issue: Extract<ZodIssue, { code: 'too_small' }>): string {
  return `${issue.inclusive === false ? 'more than' : 'at least'} ${issue.minimum}${unitOf(issue.origin)}`
}

function most(issue: Extract<ZodIssue, { code: 'too_big' }>): string {
  return `${issue.inclusive === false ? 'less than' : 'at most'} ${issue.maximum}${unitOf(issue.origin)}`
}

function unitOf(origin: string): string {
  if (origin === 'string') return ' characters'
  return origin === 'array' ? ' entries' : ''
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

function list(values: readonly unknown[]): string {
  return values.map((value) => JSON.stringify(value)).join(', ')
}
