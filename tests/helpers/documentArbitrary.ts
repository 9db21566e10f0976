/**
 * Sound documents of every kind for property tests: the sizes are such that bars, spirals and voids always fit, whatever is
 * drawn, and each optional field is there or not.
 */
import fc from 'fast-check'

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const angle = fc.oneof(fc.integer({ min: -720, max: 720 }), between(-720, 720), fc.constant(-0))
const point = fc.tuple(between(-40, 40), between(-40, 40))
const name = fc.string({ minLength: 1, maxLength: 20 }).filter((text) => text === text.trim() && text !== '')

const outline = fc.oneof(
  fc.record({ kind: fc.constant('circle'), diameter: between(1200, 3000) }),
  fc.record(
    {
      kind: fc.constant('rectangle'),
      width: between(1400, 3000),
      depth: between(1400, 3000),
      chamfer: between(0, 100),
    },
    { requiredKeys: ['kind', 'width', 'depth'] },
  ),
  fc.record({ kind: fc.constant('oblong'), width: between(1200, 3000), depth: between(1200, 3000) }),
  fc.constant({
    kind: 'polygon',
    points: [
      [-800, -700],
      [800, -700],
      [800, 700],
      [-0, 900],
      [-800, 700],
    ],
  }),
)

const hole = fc.record(
  {
    kind: fc.constant('circle'),
    centre: fc.constant([0, -0]),
    diameter: between(20, 60),
    lining: fc.boolean(),
  },
  { requiredKeys: ['kind', 'centre', 'diameter'] },
)

const spiral = fc.record(
  {
    id: name,
    centre: point,
    diameter: between(400, 900),
    barDiameter: between(8, 20),
    barArea: between(50, 400),
    pitch: between(40, 150),
    form: fc.constantFrom('spiral', 'hoop'),
    steel: fc.constantFrom('L', 'T'),
  },
  { requiredKeys: ['id', 'centre', 'diameter', 'barDiameter', 'pitch', 'form', 'steel'] },
)

/** Rings of at most 12 bars of at most 25 mm on 250 to 300 mm and on 400 to 500 mm never meet. */
const ring = (min: number, max: number) =>
  fc.record(
    {
      layout: fc.record(
        {
          kind: fc.constant('ring'),
          centre: fc.constant([-0, 0]),
          diameter: between(min, max),
          count: fc.integer({ min: 1, max: 12 }),
          startAngle: angle,
        },
        { requiredKeys: ['kind', 'centre', 'diameter', 'count'] },
      ),
      barDiameter: between(10, 25),
      barArea: between(50, 600),
      steel: fc.constantFrom('L', 'T'),
    },
    { requiredKeys: ['layout', 'barDiameter', 'steel'] },
  )

const steelCommon = {
  yieldStrength: between(200, 700),
  modulus: between(180_000, 220_000),
  specified: fc.record(
    { yieldStrength: between(200, 700), tensileStrength: between(200, 900) },
    { requiredKeys: ['yieldStrength'] },
  ),
  limitStrain: between(0.01, 0.09),
  buckling: fc.constant({ kind: 'none' }),
  strainAtMaximumStress: between(0.05, 0.15),
}
type SteelField = keyof typeof steelCommon

const steel = fc.oneof(
  fc.record(
    {
      law: fc.constant('menegotto-pinto'),
      ...steelCommon,
      hardeningRatio: between(0, 0.05),
      tensileStrength: between(700, 900),
      r0: between(19, 25),
      a1: between(0, 18.9),
      a2: between(0.1, 1),
      a3: fc.oneof(fc.constant(-0), between(0, 0.1)),
      a4: between(0, 10),
    },
    { requiredKeys: ['law', 'yieldStrength', 'tensileStrength', 'strainAtMaximumStress'] },
  ),
  fc.record(
    {
      law: fc.constant('plateau-hardening'),
      ...steelCommon,
      tensileStrength: between(701, 900),
      hardeningStrain: between(0.005, 0.02),
      hardeningModulus: between(2000, 9000),
    },
    {
      requiredKeys: [
        'law',
        'yieldStrength',
        'tensileStrength',
        'hardeningStrain',
        'hardeningModulus',
        'strainAtMaximumStress',
      ],
    },
  ),
  fc.record(
    { law: fc.constant('elastic-plastic'), ...steelCommon },
    { requiredKeys: ['law', 'yieldStrength', 'strainAtMaximumStress'] satisfies ('law' | SteelField)[] },
  ),
)

const concrete = fc.record(
  {
    law: fc.constant('mander'),
    strength: between(20, 60),
    specified: fc.record({ strength: between(20, 60) }),
    peakStrain: between(0.002, 0.0024),
    spallingStrain: between(0.005, 0.008),
    modulus: between(35_000, 50_000),
    cyclic: fc.constantFrom('karsan-jirsa', 'mander'),
    tension: fc.constant({ kind: 'none' }),
  },
  { requiredKeys: ['strength'] },
)

const load = fc.double({ noNaN: true, noDefaultInfinity: true })
const cases = fc.uniqueArray(
  fc.record(
    { name, axialLoad: load, angle, combination: fc.string({ maxLength: 40 }) },
    { requiredKeys: ['name', 'axialLoad'] },
  ),
  { maxLength: 3, selector: (one) => one.name },
)

const analysisOptions = {
  kind: fc.constant('moment-curvature'),
  direction: fc.constant('curvature'),
  points: fc.integer({ min: 100, max: 2000 }),
  endAt: fc.constantFrom('first-limit', 'moment-drop-20'),
  idealisation: fc.constantFrom('first-yield-nominal', 'equal-area-beyond-yield', 'equal-area-from-zero'),
}

/** Load and angle in the analysis, or the first case where there is one and `named`. */
const withAnalysis = fc
  .record({
    cases: fc.option(cases, { nil: undefined }),
    named: fc.boolean(),
    options: fc.record(analysisOptions, { requiredKeys: ['kind'] }),
    own: fc.record({ axialLoad: load, angle }, { requiredKeys: ['axialLoad'] }),
  })
  .map(({ cases: some, named, options, own }) => ({
    ...(some && { cases: some }),
    analysis: named && some?.[0] ? { ...options, case: some[0].name } : { ...options, ...own },
  }))

export const documentArbitrary = fc
  .record({
    head: fc.record(
      {
        format: fc.constant('girdwell-analysis/1'),
        title: fc.string({ maxLength: 60 }),
        notes: fc.dictionary(fc.string({ maxLength: 20 }), fc.string({ maxLength: 60 }), {
          maxKeys: 3,
          noNullPrototype: true,
        }),
      },
      { requiredKeys: [] },
    ),
    section: fc.record(
      {
        outline,
        voids: fc.array(hole, { maxLength: 1 }),
        spirals: fc.uniqueArray(spiral, { maxLength: 3, selector: (one) => one.id }),
        bars: fc.oneof(fc.tuple(ring(250, 300)), fc.tuple(ring(250, 300), ring(400, 500))),
      },
      { requiredKeys: ['outline'] },
    ),
    materials: fc.record(
      {
        strengthBasis: fc.constantFrom('expected', 'specified', 'measured', 'design'),
        concrete,
        steels: fc.record({ L: steel, T: steel }),
        confinement: fc.record(
          {
            strength: fc.constantFrom('mander', 'none'),
            overlap: fc.constantFrom('sum', 'largest'),
            ultimateStrain: fc.constant('simplified'),
          },
          { requiredKeys: [] },
        ),
      },
      { requiredKeys: ['concrete', 'steels'] },
    ),
    rest: withAnalysis,
  })
  .map(({ head, section, materials, rest }) => ({ ...head, section, materials, ...rest }))
