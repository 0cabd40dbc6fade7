import { SCREENING_LINE } from '#shared/science/verdict/screeningCaution'
import { settingWords } from '#shared/science/verdict/settingWords'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import { sideText } from '~/charts/sideText'
import type { FigureContext } from '~/charts/figure/figure'
import type { BenchSource } from '~/utils/benchSource'
import { formatCount } from '~/utils/formatMeasures'

const MOST_NAMES = 12

/** What stands under the figures of a bench. `preview`: under limits that are not saved. */
export function benchFigures({ title, study, version }: Pick<BenchSource, 'title' | 'study' | 'version'>, settings: ComparisonSettings, filter: string, preview: boolean): FigureContext {
  const names = { A: version.sideAName, B: version.sideBName }
  return {
    file: [title, `v${version.number}${preview ? ' preview' : ''}`],
    sides: (['A', 'B'] as const).map(side => `${side} ${names[side]}: ${sideText(version.samples, side)} (${samplesOf(version.samples, side)})`),
    settings: [`Mass tolerance between tables and of traces: ${version.alignMassPpm} ppm`, ...settingWords(settings).map(([name, value]) => `${name}: ${value}`)],
    filter,
    origin: [study, `“${title}”`, `version ${version.number}${preview ? ', previewed under other limits, not saved' : ''}`].filter(Boolean).join('; '),
    engineVersion: version.engineVersion,
    cautions: [SCREENING_LINE, ...version.cautions],
  }
}

/** What passes the filter, in a line: "12 of 803 features: found only in Millrace; with a flag". */
export function filterLine(filters: readonly { words: string }[], shown: number, total: number): string {
  return filters.length === 0 ? `none, all ${formatCount(total)} compared features` : `${formatCount(shown)} of ${formatCount(total)} features: ${filters.map(({ words }) => words).join('; ')}`
}

function samplesOf(samples: BenchSource['version']['samples'], side: 'A' | 'B'): string {
  const names = samples.filter(sample => sample.kind === 'sample' && sample.side === side).map(({ name }) => name)
  return names.length > MOST_NAMES ? `${names.slice(0, MOST_NAMES).join(', ')} and ${names.length - MOST_NAMES} more` : names.join(', ')
}
