/**
 * The same section at several spiral pitches: one curve for each, all spirals at that pitch, everything else as it stands.
 * The family belongs to one document; when the section changes it is stale until it is compared again.
 */
import { computed, onScopeDispose, shallowRef, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { readDocument } from '#shared/document/readDocument.ts'
import type { SolverClient } from '@/clients/solverClient.ts'
import { describeIssue } from '@/editing/issuesAt.ts'

export interface ComparedPitch {
  /** mm */
  pitch: number
  result: MomentCurvatureResult | null
  /** Why there is no curve at this pitch. */
  problem: string | null
}

export interface PitchComparison {
  state: ComputedRef<'idle' | 'running' | 'done' | 'failed'>
  rows: Readonly<ShallowRef<ComparedPitch[]>>
  /** The section changed since the rows were computed. */
  stale: ComputedRef<boolean>
  failure: Readonly<ShallowRef<string | null>>
  compare(pitches: readonly number[]): Promise<void>
}

export function usePitchComparison(
  document: Readonly<Ref<AnalysisDocument | null>>,
  client: Pick<SolverClient, 'analyse'>,
): PitchComparison {
  const rows = shallowRef<ComparedPitch[]>([])
  const compared = shallowRef<AnalysisDocument | null>(null)
  const running = shallowRef(false)
  const failure = shallowRef<string | null>(null)
  let latest = 0
  onScopeDispose(() => (latest = -1))

  async function compare(pitches: readonly number[]) {
    const base = document.value
    if (!base) return
    const run = ++latest
    running.value = true
    failure.value = null
    const next: ComparedPitch[] = []
    try {
      for (const pitch of pitches) {
        next.push(await solveAt(base, pitch))
        if (run !== latest) return
      }
      rows.value = next
      compared.value = base
    } catch (error) {
      if (run === latest) failure.value = error instanceof Error ? error.message : String(error)
    } finally {
      if (run === latest) running.value = false
    }
  }

  async function solveAt(base: AnalysisDocument, pitch: number): Promise<ComparedPitch> {
    const candidate = withPitch(base, pitch)
    const read = readDocument(candidate)
    if (read.status === 'bad') return { pitch, result: null, problem: describeIssue(read.issues[0]) }
    const reply = await client.analyse(read.document)
    if (reply.status === 'bad-document') {
      return { pitch, result: null, problem: describeIssue(reply.issues[0]) }
    }
    const problem =
      reply.status === 'no-equilibrium' ? 'no equilibrium under this axial load, even without bending' : null
    return { pitch, result: reply.result, problem }
  }

  return {
    state: computed(() => {
      if (running.value) return 'running'
      if (failure.value !== null) return 'failed'
      return rows.value.length > 0 ? 'done' : 'idle'
    }),
    rows,
    stale: computed(() => rows.value.length > 0 && compared.value !== document.value),
    failure,
    compare,
  }
}

/** The document with every spiral at one pitch (mm). */
export function withPitch(document: AnalysisDocument, pitch: number): AnalysisDocument {
  const spirals = document.section.spirals.map((spiral) => ({ ...spiral, pitch }))
  return { ...document, section: { ...document.section, spirals } }
}

/** "60, 80 100" as pitches in mm, ascending and each once; or what could not be read. */
export function parsePitches(text: string): { pitches: number[] } | { problem: string } {
  const words = text.split(/[\s,;]+/).filter((word) => word !== '')
  if (words.length === 0) return { problem: 'Enter pitches in mm, for example 60, 80, 100' }
  if (words.length > 12) return { problem: `Found ${words.length} pitches, allowed up to 12` }
  const pitches: number[] = []
  for (const word of words) {
    const pitch = Number(word)
    if (!Number.isFinite(pitch) || pitch <= 0) {
      return { problem: `Found "${word}", allowed numbers above 0, in mm` }
    }
    if (!pitches.includes(pitch)) pitches.push(pitch)
  }
  return { pitches: pitches.sort((a, b) => a - b) }
}
