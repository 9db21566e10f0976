/** What is selected on a section: one spiral, or one group of bars. */
export type Selection = { kind: 'spiral'; id: string } | { kind: 'bars'; group: number }

export function isSame(a: Selection | null, b: Selection | null): boolean {
  if (a === null || b === null) return a === b
  if (a.kind === 'spiral') return b.kind === 'spiral' && a.id === b.id
  return b.kind === 'bars' && a.group === b.group
}
