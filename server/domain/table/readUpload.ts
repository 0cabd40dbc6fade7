import type { SkippedKind } from '../../../shared/science/table/skippedLines'
import type { TableLayout } from '../../../shared/science/table/layout'
import type { TableColumnName } from '../../db/schema'
import type { RememberedAnswers } from '../../../shared/science/table/rememberAnswers'
import type { ProposalBasis } from '../../../shared/science/table/tableProposal'

/** What the worker is given of one file. */
export interface ReadTask {
  uploadId: string
  fileName: string
  path: string
  /** The file is an original already: compressed, and not to be kept again. */
  compressed: boolean
  originalPath: string
  /** Where the worker writes the columns it has read, one after the other: they come by file, so that no more than a part of one is in memory twice. */
  columnsPath: string
  /** What was found in the file before; null where it is looked through for the first time. */
  basis: ProposalBasis | null
  /** A person has settled what was open. */
  decided: boolean
  /** Remembered layouts, newest first. */
  layouts: { fingerprint: string, answers: RememberedAnswers }[]
}

/** Where one packed column lies in the file of columns. */
export interface ReadColumn { name: TableColumnName, offset: number, bytes: number }

export interface ReadTable {
  columns: ReadColumn[]
  features: number
  name: string | null
  emptyShare: number | null
  digest: string
  refusedRows: number
  /** Compressed JSON of RefusedRow[]; null where there are none. */
  refused: Uint8Array | null
}

/** What the worker gives back. compressedBytes is null where the original stood already. */
export type ReadUpload = {
  kind: 'waiting'
  basis: ProposalBasis
  fingerprint: string
  compressedBytes: number | null
  remark: string | null
} | {
  kind: 'read'
  basis: ProposalBasis
  fingerprint: string
  layout: TableLayout
  compressedBytes: number | null
  tables: ReadTable[]
  rowsRead: number
  skipped: Record<SkippedKind, number>
  cautions: string[]
}
