import type { MassKind } from '../table/layout'
import { ADDUCTS, type Polarity } from './adducts'
import { ionMz } from './ionMz'
import { massErrorPpm } from './massError'
import { massToleranceDa } from './tolerance'

/** What the masses of an alignment are: of ions of a polarity, or of neutral molecules. */
export interface Masses { polarity: Polarity, massKind: MassKind }

/** An ion that a molecule may show, and its m/z. For neutral masses the molecule itself, `M`. */
export interface ExpectedIon { adduct: string, mz: number }

/** The expected ion that a measured m/z lies nearest to, with the signed error in ppm. Arithmetic, never an identification. */
export interface IonFit { adduct: string, errorPpm: number }

/** The ion types looked for where nobody chose any: those most seen with water, acetonitrile or methanol, formic or acetic acid. Commonest first. */
export const USUAL_ADDUCTS: Readonly<Record<Polarity, readonly string[]>> = {
  negative: ['[M-H]-', '[M+HCOO]- (M+FA-H)', '[M+CH3COO]- (M+HAc-H)', '[M+Cl]- (35Cl)', '[M-H2O-H]-', '[2M-H]-', '[M-2H]2-'],
  positive: ['[M+H]+', '[M+NH4]+', '[M+Na]+', '[M+K]+', '[M+H-H2O]+', '[2M+H]+', '[2M+Na]+', '[M+2H]2+'],
}

/** The usual ions of a molecule of neutral mass `mass` u. For neutral masses it is the molecule itself. */
export function usualIons(mass: number, { polarity, massKind }: Masses): ExpectedIon[] {
  if (massKind === 'neutral') return [{ adduct: 'M', mz: mass }]
  return USUAL_ADDUCTS[polarity].flatMap((name) => {
    const adduct = ADDUCTS.find(each => each.name === name)
    return adduct ? [{ adduct: name, mz: ionMz(mass, adduct) }] : []
  })
}

/**
 * The nearest of these ions that lies within the tolerance of a measured m/z; null where none does.
 * The tolerance is max(ppm·10⁻⁶·m/z, the floor that follows the ppm), as against any theoretical mass.
 */
export function nearestIon(measuredMz: number, ions: readonly ExpectedIon[], ppm: number): IonFit | null {
  let fit: IonFit | null = null
  for (const { adduct, mz } of ions) {
    if (!(Math.abs(measuredMz - mz) <= massToleranceDa(mz, ppm))) continue
    const errorPpm = massErrorPpm(measuredMz, mz)
    if (!fit || Math.abs(errorPpm) < Math.abs(fit.errorPpm)) fit = { adduct, errorPpm }
  }
  return fit
}

/** The ion type by which a measured m/z is read as a neutral mass where no more is known: [M−H]⁻ or [M+H]⁺. */
export const plainAdduct = (polarity: Polarity) => USUAL_ADDUCTS[polarity][0] ?? ''
