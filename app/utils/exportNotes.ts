import { settingWords } from '#shared/science/verdict/settingWords'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import type { BenchSource } from '~/utils/benchSource'
import type { FilterWords } from '~/utils/filterWords'
import type { FeatureSort } from '~/utils/featureOrder'

/** What is shown as it is exported. */
export interface ShownState {
  source: Pick<BenchSource, 'title' | 'version' | 'exportNotes'>
  /** Settings the verdicts were made with: a preview's, or those saved. */
  settings: ComparisonSettings
  isPreview: boolean
  cautions: readonly string[]
  filters: readonly FilterWords[]
  sort: readonly FeatureSort[]
  shown: number
  total: number
}

/** What stands above a CSV of the rows shown: settings, filter in words, engine, tables and cautions. */
export function exportNotes({ source, settings, isPreview, cautions, filters, sort, shown, total }: ShownState): string[] {
  const { title, version } = source
  return [
    `Steelyard: ${shown} of ${total} features of “${title}”, version ${version.number}, as shown on the bench`,
    ...(isPreview ? ['Preview under other limits: these verdicts are not saved.'] : []),
    `Filter: ${filters.length > 0 ? filters.map(({ words }) => words).join('; ') : 'none'}`,
    `Order: ${sort.map(({ key, descending }) => `${key} ${descending ? 'descending' : 'ascending'}`).join(', then ')}`,
    `Side A: ${version.sideAName}. Side B: ${version.sideBName}. Ratios are B over A.`,
    `Engine version ${version.engineVersion}.`,
    ...source.exportNotes(),
    ...settingWords(settings).map(([name, value]) => `${name}: ${value}`),
    ...cautions.map(caution => `Caution: ${caution}`),
  ]
}

/** "steelyard-apple-juices-version-2-shown.csv": what a file of the rows shown is called. */
export function shownFileName({ title, version }: Pick<BenchSource, 'title' | 'version'>): string {
  const words = title.normalize('NFKD').replaceAll(/\p{M}+/gu, '').toLowerCase().replaceAll(/[^\p{L}\p{N}]+/gu, '-').replaceAll(/^-+|-+$/g, '').slice(0, 60)
  return `steelyard-${words || 'comparison'}-version-${version.number}-shown.csv`
}
