import type { Polarity } from '../schemas/method'
import type { MassKind } from '../science/table/layout'
import type { ComparedSample, ComparisonSettings } from '../science/verdict/settings'
import type { Verdict } from '../science/verdict/verdicts'
import type { UsedTrace } from './trace'

export interface VersionLine {
  number: number
  alignmentId: string
  alignmentNumber: number
  sideAName: string
  sideBName: string
  counts: Record<Verdict, number>
  /** What differs from the version before, as sentences. */
  differs: string[]
  createdByName: string
  createdAt: string
}

export interface ComparisonLine {
  id: string
  title: string
  practice: boolean
  createdByName: string
  createdAt: string
  versions: number
  latest: VersionLine
}

export interface ComparisonDetail {
  id: string
  title: string
  practice: boolean
  createdBy: string
  createdByName: string
  versions: VersionLine[]
  /** The version asked for, else the latest. A sample's floor that is not known comes as null. */
  version: VersionLine & {
    id: string
    settings: ComparisonSettings
    samples: (Omit<ComparedSample, 'floor'> & { floor: number | null })[]
    engineVersion: string
    /** What its masses are: of ions of this polarity, or of neutral molecules. */
    polarity: Polarity
    massKind: MassKind
    /** Mass tolerance of its alignment and of its traces, ppm. */
    alignMassPpm: number
    cautions: string[]
    /** In the order of the samples. */
    tables: { sampleName: string, fileName: string, digest: string }[]
    /** What the sample sheet says otherwise now, as sentences; empty where nothing changed. */
    sheetChanges: string[]
    /** The traces that were looked into. */
    traces: UsedTrace[]
    /** Traces that came in, were replaced or taken off since, as sentences. */
    traceChanges: string[]
  }
  /** May the asking person save a new version? */
  mayChange: boolean
}

/** What changed between two versions. `before` is the one compared with. */
export interface VersionChanges {
  before: ChangedVersion
  after: ChangedVersion
  /** What differs in settings, samples and alignment, as sentences. */
  differs: string[]
  /** Features found in both alignments, one by one; in the same alignment all. */
  matched: number
  /** Features of one alignment whose most intense member stands in no feature of the other, or in one matched already. */
  onlyBefore: number
  onlyAfter: number
  /** Matched features by verdict before and after, changed or not. */
  moves: { from: Verdict, to: Verdict, count: number }[]
  /** Matched features whose verdict changed, most intense first, at most 5,000. */
  features: ChangedFeature[]
  changed: number
}

export interface ChangedVersion {
  comparisonId: string
  title: string
  number: number
  alignmentNumber: number
  counts: Record<Verdict, number>
}

export interface ChangedFeature {
  /** Place in the alignment after, and before. */
  index: number
  indexBefore: number
  mz: number
  retentionMinutes: number
  highestCounts: number
  from: Verdict
  to: Verdict
  /** Codes of REASONS. */
  reasonFrom: number
  reasonTo: number
}
