/**
 * Keeps a result for a document that changes: one run in flight, one waiting, the newest wins. A result always
 * says which document it belongs to, so an old one can be shown as stale and never be mixed with new inputs.
 */
import { computed, onScopeDispose, shallowRef, watch, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import type { AnalysisDocument, Issue } from '#shared/document/analysisDocument.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { SolverStoppedError, type SolverClient } from '@/clients/solverClient.ts'

export type AnalysisState = 'idle' | 'running' | 'done' | 'partial' | 'unsound' | 'failed'

export interface LiveAnalysis {
  /**
   * idle: nothing asked yet; running: an answer is on its way; done: the result belongs to the document;
   * partial: solved, but no equilibrium even at zero curvature; unsound: the document has issues;
   * failed: the solver stopped.
   */
  state: ComputedRef<AnalysisState>
  /** Latest result, whole; it may belong to an earlier document. */
  result: Readonly<ShallowRef<MomentCurvatureResult | null>>
  /** The result shown does not belong to the document as it stands. */
  stale: ComputedRef<boolean>
  issues: ComputedRef<Issue[]>
  /** Why the solver stopped. */
  failure: Readonly<ShallowRef<string | null>>
  /** From the latest change of the document to its result, ms. */
  delay: Readonly<ShallowRef<number | null>>
  computeAgain(): void
}

export interface LiveAnalysisOptions {
  /** The document to solve, replaced whole on every change; null: none yet. */
  document: Readonly<Ref<AnalysisDocument | null>>
  /** Issues of the document; while there are any it is not sent. */
  issues: ComputedRef<Issue[]>
  client: Pick<SolverClient, 'analyse'>
}

export function useAnalysis({ document, issues, client }: LiveAnalysisOptions): LiveAnalysis {
  const result = shallowRef<MomentCurvatureResult | null>(null)
  const answered = shallowRef<AnalysisDocument | null>(null)
  const failure = shallowRef<string | null>(null)
  const delay = shallowRef<number | null>(null)
  const refused = shallowRef<Issue[]>([])
  let inFlight = false
  let disposed = false
  let changedAt = 0

  async function run() {
    if (inFlight || disposed) return
    const asked = document.value
    if (!asked || issues.value.length > 0 || failure.value !== null || asked === answered.value) return
    const startedAt = changedAt
    inFlight = true
    try {
      const reply = await client.analyse(asked)
      if (disposed) return
      answered.value = asked
      if (reply.status === 'bad-document') {
        refused.value = reply.issues
      } else {
        refused.value = []
        result.value = reply.result
        delay.value = performance.now() - startedAt
      }
    } catch (error) {
      if (disposed) return
      failure.value =
        error instanceof SolverStoppedError ? error.message : `The solver failed: ${String(error)}`
    } finally {
      inFlight = false
    }
    // What changed meanwhile is solved next; steps in between are skipped.
    void run()
  }

  watch(
    document,
    () => {
      changedAt = performance.now()
      failure.value = null
      void run()
    },
    { immediate: true },
  )
  onScopeDispose(() => (disposed = true))

  const allIssues = computed(() => {
    if (issues.value.length > 0) return issues.value
    return answered.value === document.value ? refused.value : []
  })
  const fresh = computed(() => document.value !== null && answered.value === document.value)

  return {
    state: computed(() => {
      if (document.value === null) return 'idle'
      if (allIssues.value.length > 0) return 'unsound'
      if (failure.value !== null) return 'failed'
      if (!fresh.value) return 'running'
      return result.value && result.value.points.curvature.length > 0 ? 'done' : 'partial'
    }),
    result,
    stale: computed(() => result.value !== null && (!fresh.value || allIssues.value.length > 0)),
    issues: allIssues,
    failure,
    delay,
    computeAgain() {
      failure.value = null
      answered.value = null
      void run()
    },
  }
}
