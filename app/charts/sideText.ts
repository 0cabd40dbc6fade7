import type { ComparedSample } from '#shared/science/verdict/settings'
import { counted, threeDigits } from '#shared/science/numeric/numberWords'

type Weighed = Pick<ComparedSample, 'side' | 'kind' | 'name' | 'preparation' | 'amount' | 'amountUnit'>

/** The samples and weights of one side in a line: "3 samples of 3 preparations, 98.2 to 104 mg". */
export function sideText(samples: readonly Weighed[], side: 'A' | 'B'): string {
  const own = samples.filter(sample => sample.kind === 'sample' && sample.side === side)
  const preparations = new Set(own.map(sample => sample.preparation ? `p${sample.preparation}` : `s${sample.name}`)).size
  const how = preparations === own.length ? counted(own.length, 'preparation') : `${counted(own.length, 'sample')} of ${counted(preparations, 'preparation')}`
  return `${how}, ${weights(own)}`
}

function weights(samples: readonly Weighed[]): string {
  const weighed = samples.flatMap(({ amount, amountUnit }) => amount !== null ? [{ amount, unit: amountUnit ?? 'mg' }] : [])
  const units = [...new Set(weighed.map(({ unit }) => unit))]
  if (weighed.length === 0) return 'no amount stated'
  const ranges = units.map((unit) => {
    const amounts = weighed.flatMap(each => each.unit === unit ? [each.amount] : [])
    const [low, high] = [Math.min(...amounts), Math.max(...amounts)].map(threeDigits)
    return low === high ? `${low} ${unit}` : `${low} to ${high} ${unit}`
  })
  const missing = samples.length - weighed.length
  return ranges.join(' and ') + (missing > 0 ? `, ${missing} without amount` : '')
}
