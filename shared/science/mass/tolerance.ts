/** The m/z below which a relative tolerance gives way to its floor: 5 ppm there is 0.001 Da (EU 2021/808). */
export const floorBelowMz = 200

/** The floor in Da that follows a ppm tolerance unless one is set by hand: ppm × 200·10⁻⁶. */
export const massFloorDa = (ppm: number): number => ppm * 1e-6 * floorBelowMz

/**
 * Half the width in Da of a mass tolerance at an m/z: max(ppm·10⁻⁶·m/z, floor).
 *
 * @param mz m/z at which the tolerance is asked for
 * @param ppm tolerance in parts per million
 * @param floorDa smallest tolerance in Da; null takes the floor that follows the ppm
 */
export function massToleranceDa(mz: number, ppm: number, floorDa: number | null = null): number {
  return Math.max(ppm * 1e-6 * mz, floorDa ?? massFloorDa(ppm))
}
