import type { ComparisonDetail, ComparisonLine, VersionLine } from '#shared/types/comparison'
import type { BenchSource } from '~/utils/benchSource'
import { manyVerdicts } from '../../support/manyFeatures'

/** Sixty judged features of every kind, with the intensities they rest on. */
export const judged = manyVerdicts(60)
export const sideNames = { a: 'Millrace', b: 'Tallow Lane' }
const AT = '2026-02-03T11:30:00.000Z'

export const inventedVersionLine: VersionLine = {
  number: 2, alignmentId: 'a1', alignmentNumber: 1, sideAName: sideNames.a, sideBName: sideNames.b, counts: judged.result.counts,
  differs: ['Reach limit: ×5 before, ×3 now.'], createdByName: 'Eve Lark', createdAt: AT,
}

export const inventedVersion: ComparisonDetail['version'] = {
  ...inventedVersionLine, id: 'v2', settings: judged.settings, samples: [...judged.input.samples], engineVersion: '3', polarity: 'negative', massKind: 'mz', alignMassPpm: 10,
  cautions: [], tables: [], sheetChanges: [], traces: [], traceChanges: [],
}

export const inventedComparison: ComparisonDetail = {
  id: 'c1', title: 'Millrace against Tallow Lane', practice: false, createdBy: 'p1', createdByName: 'Eve Lark',
  versions: [{ ...inventedVersionLine, number: 1, differs: [] }, inventedVersionLine], version: inventedVersion, mayChange: true,
}

export const inventedComparisonLine: ComparisonLine = {
  id: 'c1', title: 'Millrace against Tallow Lane', practice: false, createdByName: 'Eve Lark', createdAt: AT, versions: 2, latest: inventedVersionLine,
}

/** What the bench of that version shows, without raw data. */
export const inventedSource: BenchSource = {
  title: inventedComparison.title, study: 'Two apple juices', version: inventedVersion, exportNotes: () => ['As invented.'],
  loadVerdicts: async () => judged.result, loadData: async () => judged.input, loadTraces: null, loadExtracted: null,
}
