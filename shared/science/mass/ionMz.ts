import type { Adduct } from './adducts'

/** m/z of an ion of a molecule of neutral mass `mass` u: (k·M + shift) / |z|. */
export function ionMz(mass: number, adduct: Pick<Adduct, 'molecules' | 'shift' | 'charge'>): number {
  return (adduct.molecules * mass + adduct.shift) / Math.abs(adduct.charge)
}

/** Neutral mass in u of the molecule that would give an ion of m/z `mz` with this adduct: the inverse of ionMz. */
export function neutralMass(mz: number, adduct: Pick<Adduct, 'molecules' | 'shift' | 'charge'>): number {
  return (mz * Math.abs(adduct.charge) - adduct.shift) / adduct.molecules
}
