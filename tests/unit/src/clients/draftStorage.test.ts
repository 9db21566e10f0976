import { describe, expect, it } from 'vitest'
import { createDraftStorage, type Draft } from '@/clients/draftStorage.ts'

function createStorage() {
  const kept = new Map<string, string>()
  return {
    kept,
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, value: string) => void kept.set(key, value),
    removeItem: (key: string) => void kept.delete(key),
  }
}

const draft = {
  title: 'Pier 3',
  document: { section: {}, materials: {}, analysis: {} },
  baseRevision: 4,
  changedAt: 1_790_000_000_000,
} as unknown as Draft

describe('draftStorage', () => {
  it('finds what it kept, per section', () => {
    const drafts = createDraftStorage(createStorage())
    expect(drafts.keep('s1', draft)).toBe(true)
    expect(drafts.find('s1')).toEqual(draft)
    expect(drafts.find('s2')).toBeUndefined()
    drafts.remove('s1')
    expect(drafts.find('s1')).toBeUndefined()
  })

  it('says when the browser refuses to keep more', () => {
    const full = createStorage()
    full.setItem = () => {
      throw new DOMException('quota', 'QuotaExceededError')
    }
    expect(createDraftStorage(full).keep('s1', draft)).toBe(false)
  })

  it.each([
    '{ cut off',
    'null',
    '[]',
    '{"title":"x"}',
    '{"title":"x","baseRevision":1,"changedAt":1,"document":null}',
  ])('restores nothing from %s', (text) => {
    const storage = createStorage()
    const drafts = createDraftStorage(storage)
    drafts.keep('s1', draft)
    const [key] = storage.kept.keys()
    storage.kept.set(key, text)
    expect(drafts.find('s1')).toBeUndefined()
  })
})
