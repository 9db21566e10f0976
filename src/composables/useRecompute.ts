/** The same numbers once more, on this machine, and how far they lie from the stored ones. */
import { computed, shallowRef, type ComputedRef, type ShallowRef } from 'vue'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import type { SolverClient } from '@/clients/solverClient.ts'
import { compareResults, type ResultComparison } from '@/plotting/compareResults.ts'

/** Relative difference up to which two results are the same: engines differ in the last digits of exp and pow. */
export const allowedDifference = 1e-6

export interface Recompute {
  state: ComputedRef<'idle' | 'running' | 'same' | 'different' | 'failed'>
  comparison: Readonly<ShallowRef<ResultComparison | null>>
  failure: Readonly<ShallowRef<string | null>>
  run(stored: MomentCurvatureResult): Promise<void>
}

export function useRecompute(client: Pick<SolverClient, 'analyse'>): Recompute {
  const comparison = shallowRef<ResultComparison | null>(null)
  const failure = shallowRef<string | null>(null)
  const running = shallowRef(false)

  async function run(stored: MomentCurvatureResult) {
    running.value = true
    failure.value = null
    try {
      const reply = await client.analyse(stored.document)
      if (reply.status === 'bad-document') {
        failure.value = `The stored input is not sound any more: ${reply.issues[0].path} ${reply.issues[0].message}.`
      } else {
        comparison.value = compareResults(stored, reply.result)
      }
    } catch (error) {
      failure.value = error instanceof Error ? error.message : String(error)
    } finally {
      running.value = false
    }
  }

  return {
    state: computed(() => {
      if (running.value) return 'running'
      if (failure.value !== null) return 'failed'
      if (!comparison.value) return 'idle'
      return comparison.value.largest <= allowedDifference ? 'same' : 'different'
    }),
    comparison,
    failure,
    run,
  }
}
