import fQuantile from '@stdlib/stats-base-dists-f-quantile'

/**
 * Two-sided quantile of Student's t: the t that |T| stays below with probability `coverage` (0 to 1), from t² ~ F(1, df).
 * Exact, but some microseconds a call; loops over features use studentQuantileOf.
 */
export function studentQuantile(coverage: number, degreesOfFreedom: number): number {
  return Math.sqrt(fQuantile(coverage, 1, degreesOfFreedom))
}

const NODES = 32

/**
 * The same quantile for one coverage and many df: log t is a smooth function of 1/df, so it is interpolated at
 * Chebyshev nodes on 1/df in (0, 1] (barycentric; relative error below 1e-11). Below one df the exact one is called.
 */
export function studentQuantileOf(coverage: number): (degreesOfFreedom: number) => number {
  const at = new Float64Array(NODES)
  const weight = new Float64Array(NODES)
  const value = new Float64Array(NODES)
  for (let k = 0; k < NODES; k++) {
    const angle = (2 * k + 1) * Math.PI / (2 * NODES)
    at[k] = (1 + Math.cos(angle)) / 2
    weight[k] = (k % 2 === 0 ? 1 : -1) * Math.sin(angle)
    value[k] = Math.log(studentQuantile(coverage, 1 / at[k]!))
  }
  return (degreesOfFreedom) => {
    if (!(degreesOfFreedom >= 1)) return studentQuantile(coverage, degreesOfFreedom)
    const inverse = 1 / degreesOfFreedom
    let above = 0
    let below = 0
    for (let k = 0; k < NODES; k++) {
      const distance = inverse - at[k]!
      if (distance === 0) return Math.exp(value[k]!)
      const share = weight[k]! / distance
      above += share * value[k]!
      below += share
    }
    return Math.exp(above / below)
  }
}
