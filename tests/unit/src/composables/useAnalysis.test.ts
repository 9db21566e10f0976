import { describe, expect, it } from 'vitest'
import { computed, effectScope, nextTick, shallowRef } from 'vue'
import type { AnalysisDocument, Issue } from '#shared/document/analysisDocument.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import type { AnalyseReply } from '#shared/solverApi.ts'
import { SolverStoppedError } from '@/clients/solverClient.ts'
import { useAnalysis } from '@/composables/useAnalysis.ts'

const documentOf = (title: string) => ({ title }) as AnalysisDocument
const resultOf = (title: string, points = 2) =>
  ({
    document: documentOf(title),
    points: { curvature: new Array(points).fill(0) },
  }) as unknown as MomentCurvatureResult

/** A solver whose answers the test gives by hand. */
function setup(first: AnalysisDocument | null = documentOf('first')) {
  const asked: { document: AnalysisDocument; answer(reply: AnalyseReply): void; fail(error: Error): void }[] =
    []
  const document = shallowRef(first)
  const issues = shallowRef<Issue[]>([])
  const client = {
    analyse: (sent: unknown) =>
      new Promise<AnalyseReply>((answer, fail) =>
        asked.push({ document: sent as AnalysisDocument, answer, fail }),
      ),
  }
  const scope = effectScope()
  const live = scope.run(() => useAnalysis({ document, issues: computed(() => issues.value), client }))!
  const settle = async () => {
    for (let i = 0; i < 6; i++) await nextTick()
  }
  return { asked, document, issues, live, scope, settle }
}

describe('useAnalysis', () => {
  it('solves the document at hand and says that the result belongs to it', async () => {
    const { asked, live, settle } = setup()
    expect(live.state.value).toBe('running')
    asked[0].answer({ status: 'solved', result: resultOf('first') })
    await settle()
    expect(live.state.value).toBe('done')
    expect(live.stale.value).toBe(false)
    expect(live.delay.value).toBeGreaterThanOrEqual(0)
  })

  it('keeps the earlier result, stale, while a new one is on its way', async () => {
    const { asked, document, live, settle } = setup()
    asked[0].answer({ status: 'solved', result: resultOf('first') })
    await settle()
    document.value = documentOf('second')
    await settle()
    expect(live.stale.value).toBe(true)
    expect(live.result.value?.document.title).toBe('first')
    asked[1].answer({ status: 'solved', result: resultOf('second') })
    await settle()
    expect(live.stale.value).toBe(false)
    expect(live.result.value?.document.title).toBe('second')
  })

  it('has one run in flight and solves only the newest of those that waited', async () => {
    const { asked, document, live, settle } = setup()
    for (const title of ['second', 'third', 'fourth']) {
      document.value = documentOf(title)
      await settle()
    }
    expect(asked).toHaveLength(1)
    asked[0].answer({ status: 'solved', result: resultOf('first') })
    await settle()
    expect(live.stale.value).toBe(true)
    expect(asked.map((run) => run.document.title)).toEqual(['first', 'fourth'])
    asked[1].answer({ status: 'solved', result: resultOf('fourth') })
    await settle()
    expect(live.state.value).toBe('done')
  })

  it('does not send an unsound document and keeps the last sound result stale', async () => {
    const { asked, document, issues, live, settle } = setup()
    asked[0].answer({ status: 'solved', result: resultOf('first') })
    await settle()
    issues.value = [{ path: 'section.spirals[0].pitch', code: 'range', message: 'too small' }]
    document.value = documentOf('bad')
    await settle()
    expect(asked).toHaveLength(1)
    expect(live.state.value).toBe('unsound')
    expect(live.stale.value).toBe(true)
    expect(live.issues.value).toHaveLength(1)
  })

  it('says that the solver stopped, keeps the last result, and computes again when told', async () => {
    const { asked, live, settle } = setup()
    asked[0].fail(new SolverStoppedError('The solver stopped: out of memory.'))
    await settle()
    expect(live.state.value).toBe('failed')
    expect(live.failure.value).toContain('out of memory')
    live.computeAgain()
    await settle()
    expect(live.state.value).toBe('running')
    asked[1].answer({ status: 'solved', result: resultOf('first') })
    await settle()
    expect(live.state.value).toBe('done')
  })

  it('tells a section without equilibrium from one that was solved', async () => {
    const { asked, live, settle } = setup()
    asked[0].answer({ status: 'no-equilibrium', result: resultOf('first', 0) })
    await settle()
    expect(live.state.value).toBe('partial')
  })

  it('drops an answer that comes after the page was left', async () => {
    const { asked, live, scope, settle } = setup()
    scope.stop()
    asked[0].answer({ status: 'solved', result: resultOf('first') })
    await settle()
    expect(live.result.value).toBeNull()
  })
})
