/** Strain limits at points of a section, as the limit states of a moment-curvature analysis. */
import type { LimitStateKind } from '#shared/document/analysisResult.ts'
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type { SectionModel } from '../section/sectionModel.ts'
import type { BranchState } from './branch.ts'

export interface WatchedStrain {
  kind: LimitStateKind
  item?: string
  /** Place along v, mm. */
  v: number
  /** Limit strain, compression positive. */
  limit: number
  /** Ends the analysis (`endAt: "first-limit"`). */
  ends: boolean
}

/** The strain of the void's face that counts as its failure. */
const voidFaceStrain = 0.005

/** All strain limits in the order of the document: spirals, steels, voids, then the outline. */
export function listWatchedStrains(document: AnalysisDocument, model: SectionModel): WatchedStrain[] {
  const watched: WatchedStrain[] = []
  model.spirals.forEach((state, i) => {
    watched.push({
      kind: 'spiral-fracture',
      item: state.spiral.id,
      v: model.spiralTops[i],
      limit: state.ultimateStrain,
      ends: true,
    })
  })
  model.steels.forEach((steel, index) => {
    const item = model.steelNames[index]
    const extent = findBarExtent(model, index)
    if (!extent) return
    const { lowest, highest } = extent
    if (steel.limitStrain !== null) {
      watched.push({ kind: 'bar-rupture', item, v: lowest, limit: -steel.limitStrain, ends: true })
    }
    watched.push(
      { kind: 'bar-yield-tension', item, v: lowest, limit: -steel.yieldStrain, ends: false },
      { kind: 'bar-0.015', item, v: lowest, limit: -0.015, ends: false },
      { kind: 'bar-yield-compression', item, v: highest, limit: steel.yieldStrain, ends: false },
    )
  })
  for (const { index, top } of model.freeFaces) {
    watched.push({ kind: 'void-face', item: String(index), v: top, limit: voidFaceStrain, ends: true })
  }
  const top = model.axes.vTop
  watched.push(
    { kind: 'concrete-0.002', v: top, limit: 0.002, ends: false },
    { kind: 'concrete-0.003', v: top, limit: 0.003, ends: false },
    { kind: 'concrete-0.004', v: top, limit: 0.004, ends: false },
    { kind: 'spalling', v: top, limit: document.materials.concrete.spallingStrain, ends: false },
  )
  return watched
}

/** How far past its limit a strain is; negative before it is reached. */
export function computeExcess(watched: WatchedStrain, state: BranchState): number {
  const strain = state.eps0 + state.kappa * watched.v
  return watched.limit > 0 ? strain - watched.limit : watched.limit - strain
}

/** v of the lowest and highest bars, of one steel or of all; null without bars. */
export function findBarExtent(
  model: SectionModel,
  steel?: number,
): { lowest: number; highest: number } | null {
  const { v, groups } = model.bars
  let lowest = Infinity
  let highest = -Infinity
  for (const group of groups) {
    if (steel !== undefined && group.steel !== steel) continue
    for (let i = group.from; i < group.to; i++) {
      if (v[i] < lowest) lowest = v[i]
      if (v[i] > highest) highest = v[i]
    }
  }
  return lowest === Infinity ? null : { lowest, highest }
}
