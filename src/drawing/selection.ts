import type { Section } from '#shared/document/analysisDocument.ts'

/** What is selected on a section: one spiral, or one group of bars. */
export type Selection = { kind: 'spiral'; id: string } | { kind: 'bars'; group: number }

/** What can be taken hold of, and for what. */
export type Grip =
  | { kind: 'move-spiral'; id: string }
  | { kind: 'resize-spiral'; id: string }
  | { kind: 'ring'; group: number }
  | { kind: 'bars'; group: number }

export function isSame(a: Selection | null, b: Selection | null): boolean {
  if (a === null || b === null) return a === b
  if (a.kind === 'spiral') return b.kind === 'spiral' && a.id === b.id
  return b.kind === 'bars' && a.group === b.group
}

/** Everything that can be selected, in the order of the keyboard: spirals, then groups of bars. */
export function listSelectable({ spirals, bars }: Section): Selection[] {
  return [
    ...spirals.map(({ id }): Selection => ({ kind: 'spiral', id })),
    ...bars.map((_, group): Selection => ({ kind: 'bars', group })),
  ]
}

/** What is selected by taking hold of something. */
export function toSelection(grip: Grip): Selection {
  return grip.kind === 'move-spiral' || grip.kind === 'resize-spiral'
    ? { kind: 'spiral', id: grip.id }
    : { kind: 'bars', group: grip.group }
}
