import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { toShown } from '#shared/units.ts'

/** A point of a plot in shown units: curvature 1/m, moment kN·m. */
export interface PlotPoint {
  x: number
  y: number
}

export function toCurveSeries(result: MomentCurvatureResult): PlotPoint[] {
  const { curvature, moment } = result.points
  return curvature.map((value, i) => ({ x: toShown('curvature', value), y: toShown('moment', moment[i]) }))
}

/** The idealised curve: elastic to yield, level to the ultimate curvature; empty where it does not exist. */
export function toIdealisedSeries(result: MomentCurvatureResult): PlotPoint[] {
  const { yieldCurvature, yieldMoment, ultimateCurvature } = result.idealised
  if (yieldCurvature === null || yieldMoment === null || ultimateCurvature === null) return []
  const y = toShown('moment', yieldMoment)
  return [
    { x: 0, y: 0 },
    { x: toShown('curvature', yieldCurvature), y },
    { x: toShown('curvature', ultimateCurvature), y },
  ]
}

/** Ends of axes that hold all series with a little room, at round numbers. */
export function computeAxisEnds(series: readonly (readonly PlotPoint[])[]): {
  xMax: number
  yMin: number
  yMax: number
} {
  let x = 0
  let low = 0
  let high = 0
  for (const points of series) {
    for (const point of points) {
      x = Math.max(x, point.x)
      low = Math.min(low, point.y)
      high = Math.max(high, point.y)
    }
  }
  return {
    xMax: roundUp((x || 0.01) * 1.08),
    // Rounding at zero curvature is no moment below zero.
    yMin: low < -1e-6 * high ? -roundUp(-low * 1.05) : 0,
    yMax: roundUp((high || 1) * 1.12),
  }
}

/** The next of 1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8 times a power of ten. */
export function roundUp(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value))
  const steps = [1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10]
  const step = steps.find((one) => one * power >= value * (1 - 1e-12)) ?? 10
  return step * power
}
