import type { MassKind, Measure, TimeUnit } from '../science/table/layout'
import type { ProposalBasis } from '../science/table/tableProposal'

/** reading: a job is at it. waiting: a person must answer. read: its tables stand. refused: nothing of it is kept. */
export type UploadStatus = 'reading' | 'waiting' | 'read' | 'refused'

/** One feature table as the list of tables shows it. Moments are ISO texts. */
export interface TableLine {
  id: string
  uploadId: string
  fileName: string
  /** The sample column of a wide file. */
  columnName: string | null
  wideGroup: string | null
  sampleId: string | null
  sampleName: string | null
  features: number
  refusedRows: number
  measure: Measure
  /** The unit of time in the file. */
  timeUnit: TimeUnit
  massKind: MassKind
  /** Bytes of the file as it came. */
  bytes: number
  digest: string
  /** Under 1 % empty cells in a wide file: absence means little here. */
  gapFilled: boolean
  statedFloor: number | null
  /** What was noticed while it was read, as sentences. */
  remark: string | null
  createdAt: string
  createdByName: string
  /** Alignments that rest on it. */
  alignments: number
  replacedAt: string | null
  replacedByFile: string | null
}

/** One file that is being read, waits, or was refused. */
export interface UploadLine {
  id: string
  fileName: string
  bytes: number
  status: UploadStatus
  /** Why it was refused, or what was noticed, as a sentence. */
  remark: string | null
  jobId: string | null
  /** How far the reading is, and what it does just now. */
  progress: { share: number, message: string } | null
  /** The same for files that one answer settles. */
  fingerprint: string | null
  /** What a waiting file leaves open, by the field of the answer. */
  open: string[]
  createdAt: string
  /** A waiting file is let go then. */
  expiresAt: string | null
}

/** A file with what its proposal is made from (proposeLayout). */
export interface UploadDetail extends UploadLine { basis: ProposalBasis | null, tables: number }

export interface StudyTables { tables: TableLine[], uploads: UploadLine[], samples: { id: string, name: string }[] }

/** What became of a file on its arrival. `known`: the study has this content already, and it was not kept twice. */
export interface UploadAnswer { upload: UploadLine | null, known: string | null }
