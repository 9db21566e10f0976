/**
 * The working: every derived number with its formula, the numbers put in and the source, from the values that the
 * analysis itself used. N, mm, MPa.
 */
import type { AnalysisDocument } from '#shared/document/analysisDocument.ts'
import type {
  IdealisedCurve,
  LimitState,
  WorkingLine,
  WorkingSymbol,
} from '#shared/document/analysisResult.ts'
import type { SectionModel } from '../section/sectionModel.ts'
import type { SpiralState } from '../section/spiralStates.ts'

const mander = 'Mander, Priestley & Park 1988, J. Struct. Eng. 114(8), 1804-1826'
const priestley = 'Priestley, Seible & Calvi 1996'

export function listWorking(
  document: AnalysisDocument,
  model: SectionModel,
  idealised: IdealisedCurve,
  limitStates: readonly LimitState[],
): WorkingLine[] {
  return [
    ...model.spirals.flatMap((state) => listSpiralWorking(document, state)),
    ...listZoneWorking(document, model),
    ...listIdealisedWorking(idealised, limitStates),
  ]
}

function symbol(name: string, value: number, unit = ''): WorkingSymbol {
  return { name, value, unit }
}

function listSpiralWorking({ materials }: AnalysisDocument, state: SpiralState): WorkingLine[] {
  const { spiral } = state
  const { concrete, steels } = materials
  const steel = steels[spiral.steel]
  const at = (part: string) => `spiral:${spiral.id}:${part}`
  const of = (quantity: string) => `${quantity}, spiral ${spiral.id}`
  const power = spiral.form === 'hoop' ? '²' : ''
  const idle = state.confiningStress === 0 && state.effectiveness > 0
  const pressure: WorkingLine = idle
    ? {
        id: at('confiningStress'),
        quantity: of('Confining stress'),
        formula:
          state.idleByVoid === null ? 'no confinement asked for' : 'none: wall at the void below 0.10 ds',
        symbols: [],
        value: 0,
        unit: 'MPa',
        source: 'rule of this program',
      }
    : {
        id: at('confiningStress'),
        quantity: of('Confining stress'),
        formula: "f'l = ke ρs fyh / 2",
        symbols: [
          symbol('ke', state.effectiveness),
          symbol('ρs', state.volumetricRatio),
          symbol('fyh', steel.yieldStrength, 'MPa'),
        ],
        value: state.confiningStress,
        unit: 'MPa',
        source: mander,
      }
  return [
    {
      id: at('volumetricRatio'),
      quantity: of('Volumetric ratio, to the centreline'),
      formula: 'ρs = 4 Asp / (ds s)',
      symbols: [
        symbol('Asp', spiral.barArea, 'mm²'),
        symbol('ds', spiral.diameter, 'mm'),
        symbol('s', spiral.pitch, 'mm'),
      ],
      value: state.volumetricRatio,
      unit: '',
      source: mander,
    },
    {
      id: at('effectiveness'),
      quantity: of('Effectiveness'),
      formula: `ke = (1 − s' / (2 ds))${power} / (1 − ρcc), at most 1`,
      symbols: [
        symbol("s'", spiral.pitch - spiral.barDiameter, 'mm'),
        symbol('ds', spiral.diameter, 'mm'),
        symbol('ρcc', state.rhoCc),
      ],
      value: state.effectiveness,
      unit: '',
      source: mander,
    },
    pressure,
    {
      id: at('confinedStrength'),
      quantity: of('Confined strength'),
      formula: "f'cc = f'co (2.254 √(1 + 7.94 f'l / f'co) − 2 f'l / f'co − 1.254)",
      symbols: [symbol("f'co", concrete.strength, 'MPa'), symbol("f'l", state.confiningStress, 'MPa')],
      value: state.confinedStrength,
      unit: 'MPa',
      source: mander,
    },
    {
      id: at('peakStrain'),
      quantity: of('Strain at peak'),
      formula: "εcc = εco (1 + 5 (f'cc / f'co − 1))",
      symbols: [
        symbol('εco', concrete.peakStrain),
        symbol("f'cc", state.confinedStrength, 'MPa'),
        symbol("f'co", concrete.strength, 'MPa'),
      ],
      value: state.peakStrain,
      unit: '',
      source: mander,
    },
    {
      id: at('ultimateStrain'),
      quantity: of('Ultimate strain'),
      formula: "εcu = 0.004 + 1.4 ρs fyh εsu / f'cc",
      symbols: [
        symbol('ρs', state.volumetricRatio),
        symbol('fyh', steel.yieldStrength, 'MPa'),
        symbol('εsu', steel.strainAtMaximumStress ?? 0),
        symbol("f'cc", state.confinedStrength, 'MPa'),
      ],
      value: state.ultimateStrain,
      unit: '',
      source: priestley,
    },
  ]
}

/** Only overlaps: a zone inside one spiral has that spiral's numbers. */
function listZoneWorking({ materials }: AnalysisDocument, model: SectionModel): WorkingLine[] {
  const { concrete, confinement } = materials
  return model.zones
    .filter((zone) => zone.spirals.length > 1)
    .flatMap((zone): WorkingLine[] => {
      const states = zone.spirals.map((index) => model.spirals[index])
      const ids = states.map((state) => state.spiral.id)
      const at = (part: string) => `zone:${ids.join('+')}:${part}`
      const of = (quantity: string) => `${quantity}, overlap of ${ids.join(' and ')}`
      const sum = confinement.overlap === 'sum'
      return [
        {
          id: at('confiningStress'),
          quantity: of('Confining stress'),
          formula: sum ? "f'l = Σ f'l,i" : "f'l = max f'l,i",
          symbols: states.map((state) => symbol(`f'l,${state.spiral.id}`, state.confiningStress, 'MPa')),
          value: zone.confiningStress,
          unit: 'MPa',
          source: sum ? 'equilibrium of superposed ring pressures' : 'lower bound: overlap disregarded',
        },
        {
          id: at('strength'),
          quantity: of('Confined strength'),
          formula: "f'cc = f'co (2.254 √(1 + 7.94 f'l / f'co) − 2 f'l / f'co − 1.254)",
          symbols: [symbol("f'co", concrete.strength, 'MPa'), symbol("f'l", zone.confiningStress, 'MPa')],
          value: zone.law.strength,
          unit: 'MPa',
          source: mander,
        },
        {
          id: at('peakStrain'),
          quantity: of('Strain at peak'),
          formula: "εcc = εco (1 + 5 (f'cc / f'co − 1))",
          symbols: [
            symbol('εco', concrete.peakStrain),
            symbol("f'cc", zone.law.strength, 'MPa'),
            symbol("f'co", concrete.strength, 'MPa'),
          ],
          value: zone.law.peakStrain,
          unit: '',
          source: mander,
        },
      ]
    })
}

function listIdealisedWorking(idealised: IdealisedCurve, limitStates: readonly LimitState[]): WorkingLine[] {
  const { rule, firstYieldCurvature, firstYieldMoment, yieldMoment, yieldCurvature } = idealised
  if (firstYieldCurvature === null || firstYieldMoment === null) return []
  if (yieldCurvature === null || yieldMoment === null) return []
  const nominal = limitStates.find((state) => state.kind === 'concrete-0.004' || state.kind === 'bar-0.015')
  const lines: WorkingLine[] = [
    {
      id: 'idealised:yieldCurvature',
      quantity: 'Yield curvature of the idealised curve',
      formula: "φy = φ'y My / M'y",
      symbols: [
        symbol("φ'y", firstYieldCurvature, '1/mm'),
        symbol('My', yieldMoment, 'N·mm'),
        symbol("M'y", firstYieldMoment, 'N·mm'),
      ],
      value: yieldCurvature,
      unit: '1/mm',
      source:
        rule === 'first-yield-nominal'
          ? `Priestley, Calvi & Kowalsky 2007; My at ${nominal?.kind === 'bar-0.015' ? 'bar tension 0.015' : 'concrete strain 0.004'}`
          : 'bridge practice: equal areas',
    },
  ]
  if (idealised.ductility !== null && idealised.ultimateCurvature !== null) {
    lines.push({
      id: 'idealised:ductility',
      quantity: 'Curvature ductility',
      formula: 'μφ = φu / φy',
      symbols: [symbol('φu', idealised.ultimateCurvature, '1/mm'), symbol('φy', yieldCurvature, '1/mm')],
      value: idealised.ductility,
      unit: '',
      source: 'definition',
    })
  }
  return lines
}
