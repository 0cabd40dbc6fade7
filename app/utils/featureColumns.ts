import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { METHOD, REASON_LABELS, REASONS } from '#shared/science/verdict/reasons'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import { formatIntensity, formatMinutes, formatMz } from '~/utils/formatMeasures'
import { formatFold, formatLog2, formatProbability, formatTimes } from '~/utils/formatStatistics'
import type { SortKey } from '~/utils/featureOrder'

/** A column of the feature table. */
export interface FeatureColumn {
  id: SortKey | 'reason'
  label: string
  /** Width as a track of a CSS grid. */
  track: string
  isNumber: boolean
  /** By what it sorts; null: it does not. */
  sort: SortKey | null
  cell: (feature: number) => string
  /** The full value, on hover; absent where the cell says it all. */
  full?: (feature: number) => string
}

/** All columns of the feature table over one result. */
export function featureColumns({ columns, preparationsA, preparationsB }: VerdictResult, foldLimit: number, names: SideNames): FeatureColumn[] {
  const number = (id: SortKey, label: string, track: string, cell: FeatureColumn['cell'], full?: FeatureColumn['full']): FeatureColumn => ({ id, label, track, isNumber: true, sort: id, cell, full })
  const exact = (values: Float64Array) => (i: number) => Number.isFinite(values[i]) ? String(values[i]) : ''
  return [
    number('number', '#', '4rem', i => String(i + 1)),
    number('mz', 'm/z', '6rem', i => formatMz(columns.mz[i]!), exact(columns.mz)),
    number('minutes', 'min', '4rem', i => formatMinutes(columns.retentionMinutes[i]!), exact(columns.retentionMinutes)),
    { id: 'verdict', label: 'Verdict', track: '15rem', isNumber: false, sort: 'verdict', cell: i => verdictPhrase(columns.verdict[i] ?? 0, foldLimit, names, { reason: columns.reason[i]!, atLeast: columns.atLeast[i]! }) },
    number('ratio', 'log2 B/A', '5rem', i => formatLog2(columns.log2Ratio[i]!), i => Number.isFinite(columns.log2Ratio[i]) ? `${formatFold(columns.log2Ratio[i]!, names)}; ${columns.log2Ratio[i]}` : ''),
    number('q', 'q', '5.5rem', i => columns.method[i] === METHOD.assumed ? 'assumed' : formatProbability(columns.q[i]!), exact(columns.q)),
    number('reach', 'reach', '5rem', i => formatTimes(columns.reach[i]!), exact(columns.reach)),
    number('levelA', 'level A', '7.5rem', i => formatIntensity(columns.levelA[i]!), exact(columns.levelA)),
    number('levelB', 'level B', '7.5rem', i => formatIntensity(columns.levelB[i]!), exact(columns.levelB)),
    number('foundA', 'in A', '3.5rem', i => `${columns.detectedA[i]}/${preparationsA}`),
    number('foundB', 'in B', '3.5rem', i => `${columns.detectedB[i]}/${preparationsB}`),
    number('intensity', 'highest', '7.5rem', i => formatIntensity(columns.highestCounts[i]!), exact(columns.highestCounts)),
    { id: 'reason', label: 'Reason', track: 'minmax(14rem,1fr)', isNumber: false, sort: null, cell: i => REASON_LABELS[REASONS[columns.reason[i] ?? 0] ?? 'inNeither'] },
  ]
}
