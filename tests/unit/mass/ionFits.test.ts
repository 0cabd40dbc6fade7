import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ADDUCTS } from '../../../shared/science/mass/adducts'
import { nearestIon, plainAdduct, USUAL_ADDUCTS, usualIons } from '../../../shared/science/mass/ionFits'
import { massToleranceDa } from '../../../shared/science/mass/tolerance'

const polarities = ['negative', 'positive'] as const

describe('usual ions', () => {
  it.each(polarities)('%s: each is a known adduct of that polarity', (polarity) => {
    for (const name of USUAL_ADDUCTS[polarity]) expect(ADDUCTS.find(each => each.name === name)?.polarity).toBe(polarity)
    expect(usualIons(300, { polarity, massKind: 'mz' })).toHaveLength(USUAL_ADDUCTS[polarity].length)
    expect(plainAdduct(polarity)).toBe(polarity === 'negative' ? '[M-H]-' : '[M+H]+')
  })

  it('are the molecule itself where masses are neutral', () => {
    expect(usualIons(300, { polarity: 'negative', massKind: 'neutral' })).toEqual([{ adduct: 'M', mz: 300 }])
  })
})

describe('the nearest ion', () => {
  it('is found within the tolerance, with its signed error, and not beyond', () => {
    fc.assert(fc.property(fc.double({ min: 120, max: 1500, noNaN: true }), fc.constantFrom(...polarities), fc.nat(6), fc.double({ min: 1, max: 20, noNaN: true }), fc.double({ min: -0.99, max: 0.99, noNaN: true }), (mass, polarity, place, ppm, part) => {
      const ions = usualIons(mass, { polarity, massKind: 'mz' })
      const ion = ions[place]
      if (!ion) throw new Error('no ion')
      const shift = part * massToleranceDa(ion.mz, ppm)
      const fit = nearestIon(ion.mz + shift, [ion], ppm)
      expect(fit?.adduct).toBe(ion.adduct)
      expect(fit?.errorPpm).toBeCloseTo(shift / ion.mz * 1e6, 6)
      expect(nearestIon(ion.mz + 1.01 * massToleranceDa(ion.mz, ppm), [ion], ppm)).toBeNull()
    }))
  })

  it('is the closer of two', () => {
    const ions = [{ adduct: 'one', mz: 300 }, { adduct: 'other', mz: 300.002 }]
    expect(nearestIon(300.0015, ions, 10)?.adduct).toBe('other')
    expect(nearestIon(Number.NaN, ions, 10)).toBeNull()
    expect(nearestIon(300, [], 10)).toBeNull()
  })
})
