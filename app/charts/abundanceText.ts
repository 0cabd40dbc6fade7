import { counted } from '#shared/science/numeric/numberWords'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { runBatches } from '~/charts/abundanceRun'
import { sampleDotsText } from '~/charts/sampleDots'
import { groupLabels, type SampleValue } from '~/charts/sampleValues'
import type { SideMean } from '~/charts/sideMeans'
import type { Signal } from '~/utils/benchView'
import { formatIntensity } from '~/utils/formatMeasures'
import { formatTimes } from '~/utils/formatStatistics'

/** The samples of a feature by preparation, in words. */
export function abundanceText(values: readonly SampleValue[], means: readonly SideMean[], names: SideNames): string {
  return [sampleDotsText(values, names, formatIntensity), ...means.map(mean => meanWords(mean, names)), floorWords(values, names)].filter(Boolean).join(' ')
}

/** The same over the run. */
export function runText(values: readonly SampleValue[], names: SideNames): string {
  const { batches, without } = runBatches(values)
  const runs = batches.reduce((sum, batch) => sum + batch.runs.length, 0)
  const missing = without.length === 0 ? '' : `${counted(without.length, 'sample')} without a run order in the sample sheet ${without.length === 1 ? 'is' : 'are'} not drawn here: ${listed(without.map(({ name }) => name))}.`
  if (runs === 0) return 'No sample states its run order. Give it in the sample sheet, and save a new version.'
  const drawn = batches.flatMap(batch => batch.runs)
  const among = batches.length > 1 ? ` in ${counted(batches.length, 'batch', 'batches')}` : ''
  return [`${counted(runs, 'injection')} in run order${among}.`, sampleDotsText(drawn, names, formatIntensity), floorWords(drawn, names), missing].filter(Boolean).join(' ')
}

function meanWords({ side, detected, preparations, log2, interval }: SideMean, names: SideNames): string {
  const name = side === 'A' ? names.a : names.b
  if (detected === 0) return ''
  if (preparations.length === 1) return `${name}: one preparation, so no mean and no interval.`
  if (detected === 1) return `${name}: one of ${preparations.length} preparations shows it, so no interval.`
  const of = detected === preparations.length ? counted(detected, 'preparation') : `the ${detected} of ${counted(preparations.length, 'preparation')} that show it`
  const range = interval ? `, 95 % interval ${formatIntensity(2 ** interval[0])} to ${formatIntensity(2 ** interval[1])}` : ''
  return `${name}: mean of ${of} ${formatIntensity(2 ** log2)}${range}.`
}

/** What floors the groups have, and whether they were stated. */
function floorWords(values: readonly SampleValue[], names: SideNames): string {
  const labels = groupLabels(names)
  const parts = [...new Set(values.map(({ group }) => group))].flatMap((group) => {
    const own = values.filter(value => value.group === group)
    const known = own.filter(({ floor }) => floor > 0)
    if (known.length === 0) return `${labels[group]} not known`
    const floors = known.map(({ floor }) => floor)
    const sources = [...new Set(known.map(({ floorSource }) => floorSource))].join(' and ')
    const [low, high] = [Math.min(...floors), Math.max(...floors)].map(formatIntensity)
    return `${labels[group]} ${low === high ? low : `${low} to ${high}`} (${sources}${known.length < own.length ? `, ${own.length - known.length} not known` : ''})`
  })
  return parts.length > 0 ? `Floors: ${parts.join('; ')}.` : ''
}

/** What turns injected counts into normalised ones, in words. */
export function factorText(values: readonly SampleValue[], signal: Signal, settings: { normaliseByAmount: boolean }): string {
  if (!settings.normaliseByAmount) return 'The amount step of this comparison is off: normalised is as injected.'
  const factors = values.filter(({ group }) => group === 'A' || group === 'B').map(({ factor }) => factor)
  if (factors.length === 0) return ''
  const [low, high] = [Math.min(...factors), Math.max(...factors)].map(formatTimes)
  const range = low === high ? `one factor, ${low}` : `factors from ${low} to ${high}`
  return signal === 'normalised'
    ? `Samples of the sides are normalised by amount, volume, dilution and injection (${range}); blanks, pooled QCs and standards stand as injected.`
    : `Counts as each table states them; normalising would apply ${range}.`
}

function listed(names: readonly string[]): string {
  return names.length > 6 ? `${names.slice(0, 5).join(', ')} and ${names.length - 5} more` : names.join(', ')
}
