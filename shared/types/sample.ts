import type { SampleField, SampleInput } from '../schemas/sample'
import type { CellValue } from '../schemas/sheet'

/** A row of the sample sheet as the server has it. */
export interface SampleRow extends SampleInput {
  id: string
  /** How many feature tables stand on it, replaced ones apart. */
  tables: number
  /** Whether an alignment holds one of its tables: then it can't be deleted. */
  aligned: boolean
  /** Who wrote a cell last, by name; cells as they came with the row are not named. */
  writtenBy: Partial<Record<SampleField, string>>
}

export interface SampleSheet { samples: SampleRow[] }

/** An edit that was not made because something else happened meanwhile. Nothing of the other person's is overwritten. */
export type SheetConflict =
  | { kind: 'cellChanged', sampleId: string, field: SampleField, yours: CellValue, theirs: CellValue, byName: string | null }
  | { kind: 'rowGone', sampleId: string, field: SampleField, yours: CellValue }
  | { kind: 'rowChanged', sampleId: string }

/** What the server would not do, and why. `row` is the sample's id, or the key of a new row. */
export interface SheetRefusal { row: string, field: SampleField | null, sentence: string }

/** The sheet after saving. */
export interface SavedSheet extends SampleSheet {
  conflicts: SheetConflict[]
  refusals: SheetRefusal[]
  /** Ids of the new rows, by their keys. */
  added: Record<string, string>
}
