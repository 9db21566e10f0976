import { expect, it } from 'vitest'
import { toSeen } from '#shared/document/seenFigures.ts'
import { analyse } from '#workers/solver/analyse.ts'
import { loadInput } from '../../../helpers/fixtureDocuments.ts'

function solve(axialLoad: number) {
  const document = loadInput('one-spiral')
  document.analysis.axialLoad = axialLoad
  const reply = analyse(document)
  if (reply.status === 'bad-document')
    throw new Error(`A sound document is solved; found ${JSON.stringify(reply.issues)}`)
  return reply.result
}

it('are digest, ultimate point and the greatest moment of the curve', () => {
  const result = solve(6_000_000)
  expect(toSeen(result)).toEqual({
    digest: result.digest,
    ultimateCurvature: result.idealised.ultimateCurvature,
    ultimateMoment: result.idealised.ultimateMoment,
    greatestMoment: Math.max(...result.points.moment),
  })
  expect(result.idealised.ultimateCurvature).toBeGreaterThan(0)
})

it('are null where there is no curve', () => {
  const result = solve(1e9)
  expect(toSeen(result)).toEqual({
    digest: result.digest,
    ultimateCurvature: null,
    ultimateMoment: null,
    greatestMoment: null,
  })
})
