/** Loadings this near to the largest, as a share of it, count as equally large: rounding must not choose among them. */
const AS_LARGE = 1e-9

/**
 * A component and its mirror image are the same; this picks the one whose largest loading, by size, is positive. Of several
 * equally large ones the first decides.
 */
export function orient<C extends { scores: Float64Array, loadings: Float64Array }>(component: C): C {
  const { scores, loadings } = component
  let largest = 0
  for (const loading of loadings) largest = Math.max(largest, Math.abs(loading))
  const first = loadings.find(loading => Math.abs(loading) >= largest * (1 - AS_LARGE)) ?? 0
  if (first >= 0) return component
  return { ...component, scores: scores.map(negative), loadings: loadings.map(negative) }
}

/** Without a negative zero. */
const negative = (value: number) => 0 - value
