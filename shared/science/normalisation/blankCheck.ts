/** Mean signal of each feature in one set of injections. */
export interface InjectedSignal {
  /** Intensities of one injection, NaN = not detected. */
  intensity: Float64Array
  /** µL; null where it is not known. */
  injectionUl: number | null
}

/**
 * Mean of the detected values of each feature, per µL injected; NaN where no injection detects it.
 * `perUl` false leaves the volumes out (they are not known for all that is compared).
 */
export function meanInjectedSignal(injections: readonly InjectedSignal[], features: number, perUl: boolean): Float64Array {
  const sum = new Float64Array(features)
  const count = new Uint32Array(features)
  for (const { intensity, injectionUl } of injections) {
    const scale = perUl && injectionUl ? 1 / injectionUl : 1
    for (let i = 0; i < features; i++) {
      const value = intensity[i]!
      if (value > 0) {
        sum[i]! += value * scale
        count[i]!++
      }
    }
  }
  for (let i = 0; i < features; i++) sum[i] = count[i]! > 0 ? sum[i]! / count[i]! : Number.NaN
  return sum
}

/**
 * Is a side's signal above the blanks: detected, and not below `blankRatio` times the blanks' mean where a blank shows it.
 * No standard fixes the ratio; guidance for bioanalysis and for residues implies 5 and 3.3.
 */
export function isAboveBlank(sideSignal: number, blankSignal: number, blankRatio: number): boolean {
  if (Number.isNaN(sideSignal)) return false
  return Number.isNaN(blankSignal) || sideSignal >= blankRatio * blankSignal
}
