import type { SampleComponents } from '#shared/science/components/sampleComponents'
import { ascendingOrder } from '#shared/science/numeric/ascendingOrder'
import { counted, signed } from '#shared/science/numeric/numberWords'
import { componentName } from '~/charts/componentAxis'
import type { LoadingPoints } from '~/charts/componentLoadings'

/** A feature with its loadings on the two components that are shown. */
export interface RankedLoading { feature: number, x: number, y: number, filled: number }

/** The features that lie farthest from the middle, farthest first; of equally far ones the first in the alignment. */
export function farthestLoadings({ features, x, y, filled }: LoadingPoints, count: number): RankedLoading[] {
  const far = ascendingOrder(x.map((value, k) => -(value * value + y[k]! * y[k]!)))
  return Array.from(far.subarray(0, count), k => ({ feature: features[k]!, x: x[k]!, y: y[k]!, filled: filled[k]! }))
}

/** How many features the words name. */
const NAMED = 3

/** The plot of loadings in words; `nameOf` names a feature. */
export function loadingsText(found: SampleComponents, points: LoadingPoints, across: number, upwards: number, nameOf: (feature: number) => string): string {
  if (points.features.length === 0) return 'No feature that takes part passes the filter.'
  const isPlane = upwards <= found.rank
  const farthest = farthestLoadings(points, NAMED).map(({ feature, x, y }) =>
    `${nameOf(feature)} (PC${across} ${signed(x, 3)}${isPlane ? `, PC${upwards} ${signed(y, 3)}` : ''})`)
  const shown = points.features.length === found.features.length ? counted(points.features.length, 'feature') : `${counted(points.features.length, 'feature')} of ${found.features.length} pass the filter`
  return `${shown}: across on ${componentName(found, across)}, upwards on ${componentName(found, upwards)}. What lies to one side is greater in the samples that lie there. Farthest out: ${farthest.join('; ')}.`
}
