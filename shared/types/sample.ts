import type { SampleInput } from '../schemas/sample'

/** A row of the sample sheet as the server has it. */
export interface SampleRow extends SampleInput {
  id: string
  /** How many feature tables stand on it, replaced ones apart. */
  tables: number
}

export interface SampleSheet { samples: SampleRow[] }
