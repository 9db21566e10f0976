import Papa from 'papaparse'
import type { MomentCurvatureResult } from '#shared/document/analysisResult.ts'
import { toShown, unitOf, type QuantityKind } from '#shared/units.ts'

interface Column {
  name: string
  kind: QuantityKind
  values: readonly (number | null)[]
}

/** Columns of a curve as shown, with their kinds. */
export function listCurveColumns({ points }: MomentCurvatureResult): Column[] {
  return [
    { name: 'curvature', kind: 'curvature', values: points.curvature },
    { name: 'moment', kind: 'moment', values: points.moment },
    { name: 'moment about the other axis', kind: 'moment', values: points.crossMoment },
    { name: 'axial strain', kind: 'strain', values: points.axialStrain },
    { name: 'neutral axis depth', kind: 'length', values: points.neutralAxisDepth },
    { name: 'cover strain', kind: 'strain', values: points.concreteStrain },
    ...Object.entries(points.spiralStrain).map(([id, values]): Column => ({
      name: `strain at spiral ${id}`,
      kind: 'strain',
      values,
    })),
    { name: 'bar strain, tension side', kind: 'strain', values: points.barStrainTension },
    { name: 'bar strain, compressed side', kind: 'strain', values: points.barStrainCompression },
    { name: 'residual', kind: 'force', values: points.residual },
    { name: 'iterations', kind: 'ratio', values: points.iterations },
  ]
}

export function headColumn({ name, kind }: Column): string {
  const unit = unitOf(kind)
  return unit === '' ? name : `${name}, ${unit}`
}

/** The points behind a curve with what they belong to, for a spreadsheet. Text that starts like a formula is disarmed. */
export function writeCurveCsv(title: string, result: MomentCurvatureResult): string {
  const columns = listCurveColumns(result)
  const { analysis, materials } = result.document
  const head = [
    ['title', title],
    ['axial load, kN, compression positive', toShown('force', analysis.axialLoad)],
    ['bending direction, °', analysis.angle],
    ['strengths', materials.strengthBasis],
    ['solver', result.solver.version],
    ['input', result.digest],
    [
      'caution',
      'Supports the work of a licensed engineer and does not replace it. Local codes, the engineer of record and the authority decide.',
    ],
    [],
  ]
  const rows = result.points.curvature.map((_, i) =>
    columns.map(({ kind, values }) => {
      const value = values[i]
      return value === null ? '' : Number(toShown(kind, value).toPrecision(9))
    }),
  )
  return Papa.unparse([...head, columns.map(headColumn), ...rows], { escapeFormulae: true })
}
