/** Longitudinal bars against spirals and against one another. mm. */
import type { AnalysisDocument, Spiral } from '#shared/document/analysisDocument.ts'
import type { Warning } from '#shared/document/analysisResult.ts'
import { placeBars, type PlacedBar } from '#shared/geometry/bars.ts'
import type { SectionModel } from '../section/sectionModel.ts'
import { isInside } from '../section/spiralStates.ts'
import { mm } from './quantities.ts'

/** A bar counts as held by a spiral when it lies this near to its wire on the inside (rounding of sizes, bends). */
const touchTolerance = 5
/** A bar farther inside than this share of the diameter is not restrained by that spiral. */
const restraintShare = 0.1
/** Clear spacing of longitudinal bars: 1.5 d and 40 mm. ACI 318-19 25.2.3 (from memory). */
const leastClear = { diameters: 1.5, length: 40 }

export function warnOfBars({ section }: AnalysisDocument, model: SectionModel): Warning[] {
  const bars = placeBars(section.bars)
  return [
    ...warnOfClashes(section.spirals, bars),
    ...(section.spirals.length > 0 ? warnOfLooseBars(section.spirals, bars, model) : []),
    ...warnOfSpacing(bars),
    ...(bars.length === 0
      ? [
          {
            code: 'no-bars',
            path: 'section.bars',
            message: 'There is no longitudinal bar: nothing carries tension.',
            source: 'common practice',
          },
        ]
      : []),
  ]
}

/** A bar that the wire of a spiral passes through. */
function warnOfClashes(spirals: readonly Spiral[], bars: readonly PlacedBar[]): Warning[] {
  return spirals.flatMap((spiral, index): Warning[] => {
    const clashing = bars.filter((bar) => {
      const fromWire = Math.abs(computeFromCentre(spiral, bar) - spiral.diameter / 2)
      return fromWire < (bar.diameter + spiral.barDiameter) / 2 - 1e-6 && !isHeld(spiral, bar)
    })
    if (clashing.length === 0) return []
    const { x, y } = clashing[0]
    return [
      {
        code: 'bar-on-wire',
        path: `section.spirals[${index}]`,
        message: `The wire of spiral ${spiral.id} passes through ${clashing.length === 1 ? 'a bar' : `${clashing.length} bars`}, the first at (${x.toFixed(0)}, ${y.toFixed(0)}). The cage cannot be assembled so.`,
        source: 'geometry',
      },
    ]
  })
}

/** Bars that no spiral holds against buckling. */
function warnOfLooseBars(
  spirals: readonly Spiral[],
  bars: readonly PlacedBar[],
  model: SectionModel,
): Warning[] {
  const loose = bars.filter(
    (bar) =>
      !spirals.some((spiral) => {
        if (!isInside(spiral, bar.x, bar.y)) return false
        const depth = spiral.diameter / 2 - computeFromCentre(spiral, bar)
        return depth <= restraintShare * spiral.diameter + bar.diameter
      }),
  )
  if (loose.length === 0 || model.spirals.length === 0) return []
  const groups = [...new Set(loose.map((bar) => bar.group))]
  return [
    {
      code: 'bar-unrestrained',
      path: `section.bars[${groups[0]}]`,
      message: `${loose.length === 1 ? 'One bar is' : `${loose.length} bars are`} restrained by no spiral, the first at (${loose[0].x.toFixed(0)}, ${loose[0].y.toFixed(0)}): in compression it may buckle early.`,
      source: 'common practice',
    },
  ]
}

function warnOfSpacing(bars: readonly PlacedBar[]): Warning[] {
  const order = [...bars].sort((a, b) => a.x - b.x)
  const reach = order.reduce((most, bar) => Math.max(most, bar.diameter), 0)
  let worst: { bar: PlacedBar; clear: number; needed: number } | null = null
  for (let i = 0; i < order.length; i++) {
    const needed = Math.max(leastClear.diameters * order[i].diameter, leastClear.length)
    for (let j = i + 1; j < order.length && order[j].x - order[i].x < needed + reach; j++) {
      const apart = Math.hypot(order[i].x - order[j].x, order[i].y - order[j].y)
      const clear = apart - (order[i].diameter + order[j].diameter) / 2
      const least = Math.max(
        leastClear.diameters * Math.max(order[i].diameter, order[j].diameter),
        leastClear.length,
      )
      if (clear < least - 1e-6 && (!worst || clear < worst.clear)) {
        worst = { bar: order[i], clear, needed: least }
      }
    }
  }
  if (!worst) return []
  return [
    {
      code: 'bar-spacing',
      path: `section.bars[${worst.bar.group}]`,
      message: `Clear distance of longitudinal bars is ${mm(worst.clear)} near (${worst.bar.x.toFixed(0)}, ${worst.bar.y.toFixed(0)}), the clause asks for ${mm(worst.needed)}.`,
      source: 'ACI 318-19 25.2.3',
    },
  ]
}

/** The bar lies against the inside of the wire: that is its own spiral. */
function isHeld(spiral: Spiral, bar: PlacedBar): boolean {
  const touching = (spiral.diameter - spiral.barDiameter - bar.diameter) / 2
  return Math.abs(computeFromCentre(spiral, bar) - touching) <= touchTolerance
}

function computeFromCentre(spiral: Spiral, bar: PlacedBar): number {
  return Math.hypot(bar.x - spiral.centre[0], bar.y - spiral.centre[1])
}
