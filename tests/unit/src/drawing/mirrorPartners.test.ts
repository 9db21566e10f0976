import { describe, expect, it } from 'vitest'
import { findMirrorPartners } from '@/drawing/mirrorPartners.ts'
import { createLayoutSection } from '../../../helpers/drawnSections.ts'

const { spirals } = createLayoutSection('five-spirals')
const list = (all: typeof spirals, id: string) =>
  findMirrorPartners(all, id)
    .map((partner) => partner.id)
    .sort()

describe('findMirrorPartners', () => {
  it('finds the other corners of a corner spiral, and none of the centre spiral', () => {
    expect(list(spirals, 'K1')).toEqual(['K2', 'K3', 'K4'])
    expect(list(spirals, 'C')).toEqual([])
    expect(list(spirals, 'gone')).toEqual([])
  })

  it('leaves out what is made otherwise or stands elsewhere', () => {
    const change = (id: string, part: object) =>
      spirals.map((one) => (one.id === id ? { ...one, ...part } : one))
    expect(list(change('K3', { pitch: 60 }), 'K1')).toEqual(['K2', 'K4'])
    expect(list(change('K3', { barDiameter: 16 }), 'K1')).toEqual(['K2', 'K4'])
    expect(list(change('K3', { diameter: 395 }), 'K1')).toEqual(['K2', 'K4'])
    expect(list(change('K3', { centre: [-485, -470] }), 'K1')).toEqual(['K2', 'K4'])
  })

  it('finds mirror images about the diagonals', () => {
    const [, K1] = spirals
    const pair = [
      { ...K1, id: 'a', centre: [100, 300] as [number, number] },
      { ...K1, id: 'b', centre: [300, 100] as [number, number] },
      { ...K1, id: 'c', centre: [-300, -100] as [number, number] },
    ]
    expect(list(pair, 'a')).toEqual(['b', 'c'])
  })

  it('maps a point of the first spiral onto its partner', () => {
    for (const partner of findMirrorPartners(spirals, 'K1')) {
      const [x, y] = partner.map([470, 480])
      const { centre } = spirals.find((one) => one.id === partner.id)!
      expect([Math.sign(x), Math.sign(y)]).toEqual(centre.map(Math.sign))
      expect([Math.abs(x), Math.abs(y)]).toEqual([470, 480])
    }
    expect(findMirrorPartners(spirals, 'K1')[0].map([0, 5])).toEqual([0, 5])
  })

  it('knows which partners turn the other way', () => {
    const senses = Object.fromEntries(findMirrorPartners(spirals, 'K1').map(({ id, sense }) => [id, sense]))
    expect(senses).toEqual({ K2: -1, K4: -1, K3: 1 })
  })
})
