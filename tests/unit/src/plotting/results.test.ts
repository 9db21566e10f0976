import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { layouts } from '#shared/catalogue/layouts.ts'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { limitStateKinds } from '#shared/document/analysisResult.ts'
import { analyse } from '#workers/solver/analyse.ts'
import { compareResults } from '@/plotting/compareResults.ts'
import { listCurveColumns, writeCurveCsv } from '@/plotting/curveCsv.ts'
import { computeAxisEnds, roundUp, toCurveSeries, toIdealisedSeries } from '@/plotting/curveSeries.ts'
import { describeCurve } from '@/plotting/describeCurve.ts'
import { describeStop, nameLimitState } from '@/plotting/limitStateNames.ts'
import { toPitchRow, writePitchCsv } from '@/plotting/pitchRows.ts'
import { listShownStates } from '@/plotting/shownStates.ts'

function compute(): MomentCurvatureResult {
  const reply = analyse(layouts.find((layout) => layout.id === 'five-spirals')!.create())
  if (reply.status !== 'solved') throw new Error('the layout is sound')
  return reply.result
}
const result = compute()
const changed = (change: (copy: MomentCurvatureResult) => void): MomentCurvatureResult => {
  const copy = structuredClone(result)
  change(copy)
  return copy
}

describe('compareResults', () => {
  it('finds no difference between a result and itself, over thousands of numbers', () => {
    expect(compareResults(result, compute())).toMatchObject({ largest: 0 })
    expect(compareResults(result, result).compared).toBeGreaterThan(2000)
  })

  it('finds one changed moment, its place and size', () => {
    const other = changed((copy) => {
      copy.points.moment[100] *= 1.001
    })
    const comparison = compareResults(result, other)
    expect(comparison.at).toBe('moment')
    expect(comparison.largest).toBeCloseTo(1e-3, 6)
    expect(comparison.stored).toBe(result.points.moment[100])
  })

  it('does not mistake rounding beside a great number for a difference', () => {
    const other = changed((copy) => {
      copy.points.moment[0] += 1e-3
    })
    expect(compareResults(result, other).largest).toBeLessThan(1e-6)
  })

  it.each([
    ['another input', (copy: MomentCurvatureResult) => (copy.digest = 'sha256:0')],
    ['another end', (copy: MomentCurvatureResult) => (copy.stop = { reason: 'moment-lost' })],
    ['fewer points', (copy: MomentCurvatureResult) => copy.points.moment.pop()],
    ['a number that is not there', (copy: MomentCurvatureResult) => (copy.idealised.ductility = null)],
  ])('calls results of different make infinitely apart: %s', (_, change) => {
    expect(
      compareResults(
        result,
        changed((copy) => void change(copy)),
      ).largest,
    ).toBe(Infinity)
  })
})

describe('words of a curve', () => {
  it('has words of the trade for every limit state', () => {
    for (const kind of limitStateKinds) {
      const words = nameLimitState({ kind, item: kind === 'void-face' ? '0' : 'L' })
      expect(words).not.toBe('')
      expect(words).not.toContain('undefined')
    }
    expect(nameLimitState({ kind: 'void-face', item: '0' })).toBe('face of void 1 fails')
  })

  it('says where equilibrium is lost and under which load', () => {
    const lost = changed((copy) => {
      copy.stop = { reason: 'no-equilibrium' }
    })
    expect(describeStop(lost).replaceAll('\u202F', ' ')).toMatch(
      /^No equilibrium beyond 0\.0\d+ 1\/m at 12 000 kN\.$/,
    )
    const none = changed((copy) => {
      copy.stop = { reason: 'no-equilibrium' }
      copy.points.curvature = []
    })
    expect(describeStop(none)).toContain('even without bending')
  })

  it('speaks the curve in sentences with units', () => {
    const words = describeCurve(result).replaceAll('\u202F', ' ')
    expect(words).toContain('axial load 12 000 kN')
    expect(words).toMatch(/greatest moment is 1\d \d{3} kN·m/)
    expect(words).toContain('ductility')
  })
})

describe('series and states', () => {
  it('converts to shown units and keeps every point', () => {
    const series = toCurveSeries(result)
    expect(series).toHaveLength(result.points.curvature.length)
    expect(series.at(-1)!.x).toBeCloseTo(result.points.curvature.at(-1)! * 1000, 12)
    expect(toIdealisedSeries(result)[1].y).toBeCloseTo(result.idealised.yieldMoment! / 1e6, 9)
  })

  it('ends axes at round numbers above the curve, and at zero below', () => {
    const { xMax, yMin, yMax } = computeAxisEnds([toCurveSeries(result)])
    expect(xMax).toBeGreaterThan(result.points.curvature.at(-1)! * 1000)
    expect(yMax).toBeGreaterThan(18_000)
    expect(yMin).toBe(0)
    expect([roundUp(1.01), roundUp(0.0234), roundUp(17_000), roundUp(1)]).toEqual([1.2, 0.025, 20_000, 1])
  })

  it('numbers states once and puts together what is reached together', () => {
    const states = listShownStates(result)
    expect(states.map((state) => state.number)).toEqual(states.map((_, i) => i + 1))
    expect(states.flatMap((state) => state.names)).toHaveLength(result.limitStates.length)
    expect(states.at(-1)!.overYield).toBeCloseTo(result.idealised.ductility!, 6)
  })
})

describe('CSV', () => {
  it('writes every point with units in the head and the caution on top', () => {
    const csv = writeCurveCsv('=Pier 3', result)
    const rows = Papa.parse<string[]>(csv).data
    expect(rows[0]).toEqual(['title', "'=Pier 3"])
    expect(csv).toContain('licensed engineer')
    const head = rows.findIndex((row) => row[0] === 'curvature, 1/m')
    expect(rows.length - head - 1).toBe(result.points.curvature.length)
    expect(rows[head]).toHaveLength(listCurveColumns(result).length)
    expect(Number(rows.at(-1)![1])).toBeCloseTo(result.points.moment.at(-1)! / 1e6, 3)
    expect(listCurveColumns(result).map((column) => column.name)).toContain('strain at spiral K4')
  })

  it('writes the table of pitches', () => {
    const csv = writePitchCsv('Pier 3', [
      toPitchRow(80, true, result, null),
      toPitchRow(12, false, null, 'too small'),
    ])
    const lines = csv.split('\r\n')
    expect(lines).toHaveLength(5)
    expect(lines[3]).toMatch(/^80,60\.\d+,C,0\.05/)
    expect(lines[4]).toBe('12,,,,,,,too small')
  })
})
