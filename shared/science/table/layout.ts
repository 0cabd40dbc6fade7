/** The mark before the decimals of a number. */
export type DecimalMark = '.' | ','
/** The mark between groups of three digits; ' ' stands for every kind of space, "'" for both apostrophes, '' for none. */
export type ThousandsMark = '' | ',' | '.' | ' ' | '\''
/** What an intensity measures: the peak's area, its height, or nobody said. */
export type Measure = 'area' | 'height' | 'unknown'
/** What stands in the mass column: m/z of an ion, or the mass of the neutral molecule. */
export type MassKind = 'mz' | 'neutral'
export type TimeUnit = 'minutes' | 'seconds'
/** long: one sample a file, one feature a row. wide: a column of intensities a sample. */
export type TableShape = 'long' | 'wide'
export type TextEncoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252'

/** A column of intensities that belongs to one sample of a wide table; its own time column where it has one. */
export interface SampleColumn { name: string, column: number, minutesColumn: number | null }

/** How one file is read, in full. Columns are counted from 0, lines from 1. */
export interface TableLayout {
  shape: TableShape
  encoding: TextEncoding
  delimiter: string
  /** The line the header stands on; null where there is none and rows start at line 1. */
  headerLine: number | null
  unitsLine: number | null
  header: string[]
  mzColumn: number
  massKind: MassKind
  /** null only in a wide table whose samples have times of their own. */
  minutesColumn: number | null
  timeUnit: TimeUnit
  /** Marks of the m/z, time and width columns. */
  decimalMark: DecimalMark
  thousandsMark: ThousandsMark
  /** null in a wide table. */
  intensityColumn: number | null
  intensityDecimalMark: DecimalMark
  intensityThousandsMark: ThousandsMark
  measure: Measure
  widthColumn: number | null
  widthUnit: TimeUnit
  /** Empty in a long table. */
  sampleColumns: SampleColumn[]
}

/** What a person has said about a file; what is not here is guessed, or asked where it can't be. */
export type LayoutAnswers = Partial<Pick<TableLayout, 'shape' | 'mzColumn' | 'massKind' | 'minutesColumn' | 'timeUnit' | 'decimalMark' | 'thousandsMark'
  | 'intensityColumn' | 'intensityDecimalMark' | 'intensityThousandsMark' | 'measure' | 'widthColumn'>> & {
  /** Columns of a wide table that look like samples and are none. */
  notSamples?: number[]
  /** Said by a person where a column names several samples: all rows are of one. */
  oneSample?: true
}

/** The largest table that is read. */
export const MAX_TABLE_ROWS = 2_000_000
/** The largest number of values above zero in all samples of a wide table. */
export const MAX_TABLE_VALUES = 10_000_000
/** More refused rows than this, and the file is refused as a whole. */
export const MAX_REFUSED_ROWS = 50_000
