// Reference: data/masses.json, made by data/make-masses.py from AME2020 and CODATA 2022 (its `source` names both).
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { ADDUCTS } from '../../shared/science/mass/adducts'
import { ELECTRON_MASS } from '../../shared/science/mass/electron'
import { monoisotopicMass } from '../../shared/science/mass/formula'
import { ionMz, neutralMass } from '../../shared/science/mass/ionMz'
import { ISOTOPES } from '../../shared/science/mass/isotopes'
import { NEUTRAL_LOSSES } from '../../shared/science/mass/losses'
import { massErrorPpm } from '../../shared/science/mass/massError'

interface Reference {
  electron: number
  isotopes: Record<string, { number: number, mass: number, abundance: number }[]>
  adducts: { name: string, polarity: string, molecules: number, shift: number, charge: number }[]
  losses: Record<string, number>
  compounds: { name: string, formula: string, mass: number, ions: Record<string, number> }[]
  separatedAt5ppm: { aMz: number, bMz: number, ppm: number }[]
}
const reference = JSON.parse(readFileSync(new URL('data/masses.json', import.meta.url), 'utf8')) as Reference

describe('masses', () => {
  it('holds the isotopes and the electron of the reference', () => {
    expect(ELECTRON_MASS).toBe(reference.electron)
    expect(ISOTOPES).toEqual(reference.isotopes)
  })

  it('holds the 40 adducts of the reference', () => {
    expect(ADDUCTS).toHaveLength(40)
    expect(ADDUCTS.map(adduct => ({ ...adduct, shift: Number(adduct.shift.toFixed(6)) }))).toEqual(reference.adducts)
  })

  it('holds the neutral losses of the reference', () => {
    expect(Object.fromEntries(NEUTRAL_LOSSES.map(loss => [loss.name, Number(loss.mass.toFixed(6))]))).toEqual(reference.losses)
  })

  it.each(reference.compounds)('gives every ion of $name within 1e-6', ({ formula, mass, ions }) => {
    expect(Math.abs(monoisotopicMass(formula) - mass)).toBeLessThan(1e-6)
    for (const adduct of ADDUCTS) {
      const mz = ionMz(monoisotopicMass(formula), adduct)
      expect(Math.abs(mz - (ions[adduct.name] ?? Number.NaN)), adduct.name).toBeLessThan(1e-6)
      expect(neutralMass(mz, adduct)).toBeCloseTo(monoisotopicMass(formula), 9)
    }
  })

  it.each(reference.separatedAt5ppm)('gives the mass error of a pair that 5 ppm separates', ({ aMz, bMz, ppm }) => {
    expect(Math.abs(massErrorPpm(bMz, aMz) - ppm)).toBeLessThan(0.02)
    expect(massErrorPpm(aMz, bMz)).toBeLessThan(-5)
  })
})
