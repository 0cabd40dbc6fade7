import type { ComparisonData } from '#shared/formats/comparisonData'
import type { ExtractedTrace, SampleTrace } from '#shared/formats/traceColumns'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import type { ComparisonDetail } from '#shared/types/comparison'

/** What the bench must know of the version it shows; a comparison of a study and a shared one both have it. */
export type BenchVersion = Pick<ComparisonDetail['version'], 'number' | 'sideAName' | 'sideBName' | 'counts' | 'settings' | 'samples' | 'cautions' | 'engineVersion' | 'polarity' | 'massKind' | 'alignMassPpm' | 'createdAt'>

/**
 * Where the bench gets what it shows. It knows no address of the server: the page of a study and the page of a share link
 * each hand it their own.
 */
export interface BenchSource {
  /** Title of the comparison; of its study too, where the reader may know it. */
  title: string
  study: string | null
  version: BenchVersion
  /** What an export made on the page says besides what the version itself tells, as sentences. */
  exportNotes: () => string[]
  loadVerdicts: () => Promise<VerdictResult>
  /** The intensities, for values per sample and previews; null where they are not to be had. */
  loadData: (() => Promise<ComparisonData>) | null
  /** Total and base peak of each sample that has raw data, which may be none; null where they are not to be had. */
  loadTraces: (() => Promise<SampleTrace[]>) | null
  /** The traces of these features' m/z in each sample that has raw data; null where they are not to be had. */
  loadExtracted: ((features: readonly number[]) => Promise<ExtractedTrace[]>) | null
}

/** What the person may do here. */
export interface BenchCapabilities {
  /** Save a new version. */
  save: boolean
  /** Address of the verdicts as CSV; null: nothing goes out, no rows and no figures either. */
  csvAddress: string | null
}
