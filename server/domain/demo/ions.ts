import { ADDUCTS } from '../../../shared/science/mass/adducts'
import { monoisotopicMass, parseFormula } from '../../../shared/science/mass/formula'
import { ionMz } from '../../../shared/science/mass/ionMz'
import { ISOTOPES } from '../../../shared/science/mass/isotopes'
import type { DemoCompound } from './compounds'

/** One signal of one compound: an adduct, or an isotope of it. */
export interface DemoIon {
  compound: number
  mz: number
  retentionMinutes: number
  /** Of the compound's main ion. */
  share: number
}

const spacingOf = (element: string, heavy: number) => (ISOTOPES[element]?.[heavy]?.mass ?? Number.NaN) - (ISOTOPES[element]?.[0]?.mass ?? Number.NaN)
const abundanceOf = (element: string, heavy: number) => (ISOTOPES[element]?.[heavy]?.abundance ?? Number.NaN) / (ISOTOPES[element]?.[0]?.abundance ?? Number.NaN)

/** Heavy isotopes that a feature table shows beside the lightest: element and place of the heavy one in ISOTOPES. */
const HEAVY = [['Cl', 1], ['S', 2], ['O', 2]] as const

/**
 * Every ion of these compounds with its isotopes: the one with one ¹³C (its share grows with the number of carbons), with two,
 * and those with ³⁷Cl, ³⁴S and ¹⁸O.
 */
export function ionsOf(compounds: readonly DemoCompound[]): DemoIon[] {
  return compounds.flatMap((compound, index) => Object.entries(compound.ions).flatMap(([name, share]) => {
    const adduct = ADDUCTS.find(candidate => candidate.name === name)
    if (!adduct) throw new Error(`${compound.name}: no adduct is called ${name}`)
    const mz = ionMz(monoisotopicMass(compound.formula), adduct)
    const ion = (shift: number, times: number): DemoIon =>
      ({ compound: index, mz: mz + shift / Math.abs(adduct.charge), retentionMinutes: compound.retentionMinutes, share: share * times })
    const atoms = parseFormula(compound.formula)
    const count = (element: string) => adduct.molecules * (atoms.get(element) ?? 0) + gainedBy(name, element)
    const carbonShare = count('C') * abundanceOf('C', 1)
    const isotopes = HEAVY.filter(([element]) => count(element) > 0).map(([element, heavy]) => ion(spacingOf(element, heavy), count(element) * abundanceOf(element, heavy)))
    return [
      ion(0, 1),
      ion(spacingOf('C', 1), carbonShare),
      ion(2 * spacingOf('C', 1), carbonShare ** 2 * (count('C') - 1) / (2 * count('C'))),
      ...isotopes,
    ]
  }))
}

/** Atoms an adduct brings that have a heavy isotope to show. */
function gainedBy(adduct: string, element: string): number {
  if (element === 'C') return adduct.includes('HCOO') ? 1 : 0
  if (element === 'Cl') return adduct.includes('35Cl') ? 1 : 0
  return 0
}
