/** A 1.2 m round column with one spiral, as the page would hand it in: optional fields left out. */
export function roundColumn(pitch = 80) {
  return {
    format: 'girdwell-analysis/1',
    title: 'Pier 3',
    section: {
      outline: { kind: 'circle', diameter: 1200 },
      spirals: [
        { id: 'S1', centre: [0, 0], diameter: 1084, barDiameter: 16, pitch, form: 'spiral', steel: 'T' },
      ],
      bars: [
        {
          layout: { kind: 'ring', centre: [0, 0], diameter: 1036, count: 20 },
          barDiameter: 32,
          steel: 'L',
        },
      ],
    },
    materials: {
      concrete: { strength: 40 },
      steels: {
        L: {
          law: 'menegotto-pinto',
          yieldStrength: 460,
          hardeningRatio: 0.008,
          strainAtMaximumStress: 0.12,
          limitStrain: 0.09,
        },
        T: { law: 'elastic-plastic', yieldStrength: 420, strainAtMaximumStress: 0.12 },
      },
    },
    analysis: { kind: 'moment-curvature', axialLoad: 6_000_000 },
  }
}
