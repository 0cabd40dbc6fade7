export type Measure = 'area' | 'height' | 'unknown'
export type MassKind = 'mz' | 'neutral'

/** A decided way to read one kind of export: which column is what, in which unit (METHODS 2). Columns count from 0, lines from 1. */
export interface TableLayout {
  shape: 'long' | 'wide'
  encoding: 'utf-8' | 'utf-16le' | 'utf-16be' | 'latin1'
  delimiter: string
  decimalMark: '.' | ','
  thousandsMark: '' | ',' | '.' | ' ' | '\''
  headerLine: number | null
  unitsLine: number | null
  mzColumn: number
  minutesColumn: number
  timeUnit: 'minutes' | 'seconds'
  /** Long tables. */
  intensityColumn: number | null
  widthColumn: number | null
  measure: Measure
  massKind: MassKind
  /** Wide tables: a column per sample. */
  sampleColumns: { name: string, column: number, minutesColumn: number | null }[]
}

/** What the first look at a file proposes, and what a person must answer or confirm first. */
export interface TableProposal {
  layout: Partial<TableLayout>
  header: string[]
  /** The header as normalised: files of the same shape share it. */
  fingerprint: string
  preview: string[][]
  questions: ProposalQuestion[]
  confirmations: ProposalQuestion[]
  /** Why this is no table, as a sentence. */
  refuse: string | null
}

export interface ProposalQuestion {
  field: keyof TableLayout
  sentence: string
  choices: { value: string | number, label: string }[]
}
