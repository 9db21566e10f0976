/**
 * Gauss stations over the depth of a section. Strips parallel to the neutral axis are cut at every corner, pole and
 * crossing of circles, so that widths are smooth in each piece. Each piece runs over an angle theta from 0 to pi,
 *
 *   v(theta) = start + length (1 - cos theta) / 2,
 *
 * in which the chord of a circle, which grows like a square root at its pole, is smooth up to the ends.
 */
export interface Stations {
  /** Two stations a cell, ascending: v (mm). */
  v: Float64Array
  /** Depth (mm) that each station stands for. */
  weight: Float64Array
  /** Lower edges of the cells and the upper edge of the last one, mm. */
  edges: Float64Array
  /** By cell: where its piece starts and how long it is (mm), and theta at the cell's lower and upper edge. */
  start: Float64Array
  length: Float64Array
  thetaFrom: Float64Array
  thetaTo: Float64Array
  /** 1 for the first and last cells of a piece, where a circle may have its pole. */
  atEnd: Uint8Array
  /** Depth of the deepest cell, mm. */
  widest: number
}

/** Distance of the two Gauss-Legendre points from the middle of a cell, as a share of its half. */
export const gaussPoint = 1 / Math.sqrt(3)
/** Breaks nearer to one another than this share of the depth are one. */
const sameBreak = 1e-9

/**
 * Stations between vBottom and vTop with about `strips` cells over the whole depth, and at least `leastCells` in each
 * piece between two breaks. Breaks outside are left out.
 */
export function createStations(
  vBottom: number,
  vTop: number,
  breaks: readonly number[],
  strips: number,
  leastCells = 3,
): Stations {
  const depth = vTop - vBottom
  const sorted = [vBottom, ...breaks.filter((v) => v > vBottom && v < vTop).sort((a, b) => a - b), vTop]
  const marks = sorted.filter((v, i) => i === 0 || v - sorted[i - 1] > sameBreak * depth)
  marks[marks.length - 1] = vTop

  const cellsOf = marks.slice(1).map((to, i) => {
    const share = (to - marks[i]) / depth
    return Math.max(leastCells, Math.ceil(share * strips))
  })
  const cells = cellsOf.reduce((sum, count) => sum + count, 0)
  const stations: Stations = {
    v: new Float64Array(2 * cells),
    weight: new Float64Array(2 * cells),
    edges: new Float64Array(cells + 1),
    start: new Float64Array(cells),
    length: new Float64Array(cells),
    thetaFrom: new Float64Array(cells),
    thetaTo: new Float64Array(cells),
    atEnd: new Uint8Array(cells),
    widest: 0,
  }
  let cell = 0
  cellsOf.forEach((count, piece) => {
    const start = marks[piece]
    const length = marks[piece + 1] - start
    const half = Math.PI / (2 * count)
    for (let k = 0; k < count; k++, cell++) {
      stations.start[cell] = start
      stations.length[cell] = length
      stations.thetaFrom[cell] = 2 * half * k
      stations.thetaTo[cell] = 2 * half * (k + 1)
      stations.atEnd[cell] = k === 0 || k === count - 1 ? 1 : 0
      stations.edges[cell] = k === 0 ? start : toPlace(start, length, 2 * half * k)
      const lower = half * (2 * k + 1 - gaussPoint)
      const upper = half * (2 * k + 1 + gaussPoint)
      stations.v[2 * cell] = toPlace(start, length, lower)
      stations.v[2 * cell + 1] = toPlace(start, length, upper)
      // dv = (length / 2) sin theta d theta, scaled so that the two make up the depth of the cell exactly.
      const depthOfCell = toPlace(start, length, 2 * half * (k + 1)) - toPlace(start, length, 2 * half * k)
      const scale = depthOfCell / (Math.sin(lower) + Math.sin(upper))
      stations.widest = Math.max(stations.widest, depthOfCell)
      stations.weight[2 * cell] = scale * Math.sin(lower)
      stations.weight[2 * cell + 1] = scale * Math.sin(upper)
    }
  })
  stations.edges[cells] = vTop
  return stations
}

function toPlace(start: number, length: number, theta: number): number {
  return start + (length / 2) * (1 - Math.cos(theta))
}
