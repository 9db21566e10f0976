import { expect } from 'vitest'

/** One value to be met: what it is, where it comes from, and how near is near enough, with the reason. */
export interface Reference {
  id: string
  source: string
  inputs: string
  got: number
  wanted: number
  /** Relative. */
  tolerance: number
  reason: string
}

export function computeRelativeDifference({ got, wanted }: Pick<Reference, 'got' | 'wanted'>): number {
  return wanted === 0 ? Math.abs(got) : Math.abs(got - wanted) / Math.abs(wanted)
}

/** Fails with the whole row: inputs, got, wanted, relative difference, tolerance and its reason. */
export function expectReference(reference: Reference): void {
  const difference = computeRelativeDifference(reference)
  const row = [
    `${reference.id} (${reference.source})`,
    `  inputs ${reference.inputs}`,
    `  got ${reference.got}`,
    `  wanted ${reference.wanted}`,
    `  relative difference ${difference.toExponential(2)}, allowed ${reference.tolerance}: ${reference.reason}`,
  ].join('\n')
  expect(difference <= reference.tolerance, row).toBe(true)
}
