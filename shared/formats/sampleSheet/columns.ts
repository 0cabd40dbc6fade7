import type { SampleField } from '../../schemas/sample'

export interface SheetColumn {
  field: SampleField
  /** Head of the column, with its unit where the unit is fixed. */
  label: string
  numeric: boolean
  /** How it may be headed elsewhere: lower case, words only, without the unit. */
  words: readonly string[]
  /** Units its head may name, and the factor to ours. */
  units?: Readonly<Record<string, number>>
}

/** The columns of the sample sheet, in their order. */
export const sheetColumns: readonly SheetColumn[] = [
  { field: 'name', label: 'name', numeric: false, words: ['name', 'sample', 'sample name', 'sample id', 'vial', 'vial name', 'injection name', 'file', 'file name', 'filename', 'id'] },
  { field: 'kind', label: 'kind', numeric: false, words: ['kind', 'type', 'sample type', 'sample kind', 'class'] },
  { field: 'side', label: 'side', numeric: false, words: ['side', 'group', 'sample group', 'condition'] },
  { field: 'preparation', label: 'preparation', numeric: false, words: ['preparation', 'prep', 'preparation name', 'extract', 'bottle', 'specimen', 'biological replicate'] },
  { field: 'amount', label: 'amount', numeric: true, words: ['amount', 'weight', 'mass', 'sample weight', 'sample amount', 'weighed', 'weighed in', 'weigh in'], units: { mg: 1, g: 1000, ug: 0.001, ml: 1, ul: 0.001, l: 1000 } },
  { field: 'amountUnit', label: 'amount unit', numeric: false, words: ['amount unit', 'unit', 'units', 'unit of amount', 'weight unit'] },
  { field: 'volumeMl', label: 'volume (mL)', numeric: true, words: ['volume', 'final volume', 'extract volume', 'extraction volume', 'solvent volume', 'made up to'], units: { ml: 1, ul: 0.001, l: 1000 } },
  { field: 'dilution', label: 'dilution', numeric: true, words: ['dilution', 'dilution factor', 'diluted', 'factor'] },
  { field: 'injectionUl', label: 'injection (µL)', numeric: true, words: ['injection', 'injection volume', 'inj volume', 'inj vol', 'injected', 'injected volume'], units: { ul: 1, ml: 1000, nl: 0.001 } },
  { field: 'runOrder', label: 'run order', numeric: true, words: ['run order', 'order', 'run', 'injection order', 'injection number', 'acquisition order', 'sequence', 'run number'] },
  { field: 'batch', label: 'batch', numeric: false, words: ['batch', 'plate', 'series', 'batch id', 'batch name'] },
]

/** Text for comparing words: lower case, letters and digits with single spaces between, µ as u. */
export function plainWords(text: string): string {
  return text.normalize('NFKC').toLowerCase().replaceAll('μ', 'u').replaceAll(/[^\p{L}\p{N}]+/gu, ' ').trim()
}
