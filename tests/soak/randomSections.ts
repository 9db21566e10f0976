/**
 * `npm run soak:solver [-- count seed]`: random sections through the solver. Prints how often each stop came, the worst
 * residual and the longest time, and every section that throws, answers with something that is no number, misses its stopping
 * test, takes long, or whose end moves when the strips are refined. Ends with 1 when there is any.
 */
import fc from 'fast-check'
import { sectionArbitrary } from '../helpers/sectionArbitrary.ts'
import { findFault, solveTimed } from '../helpers/solverFaults.ts'
import { computeOutlineArea } from '#shared/geometry/outline.ts'

const [count = 10_000, seed = 1] = process.argv.slice(2).map(Number)
const stops: Record<string, number> = {}
let worstResidual = 0
let longest = 0
let faults = 0
const startedAt = performance.now()

fc.sample(sectionArbitrary, { numRuns: count, seed }).forEach((document, index) => {
  const solved = solveTimed(document)
  const fault = findFault(document, solved)
  if (fault) {
    faults += 1
    console.log(`section ${index} of seed ${seed}: ${fault}`)
    if (faults <= 3) console.log(JSON.stringify(document))
  }
  if (solved.status === 'threw') return
  const { solution, milliseconds } = solved
  const { stop, points, diagnostics } = solution
  const reason = points.curvature.length === 0 ? 'no-equilibrium at the start' : stop.reason
  stops[reason] = (stops[reason] ?? 0) + 1
  const size = document.materials.concrete.strength * computeOutlineArea(document.section.outline)
  worstResidual = Math.max(worstResidual, diagnostics.worstResidual / size)
  longest = Math.max(longest, milliseconds)
})

console.table(stops)
console.log(
  `${count} sections, seed ${seed}: worst residual ${worstResidual.toExponential(1)} f'co Ag, longest ${longest.toFixed(0)} ms, ` +
    `${((performance.now() - startedAt) / 1000).toFixed(0)} s, ${faults} faults`,
)
process.exitCode = faults > 0 ? 1 : 0
