import { sampleSchema, type AmountUnit, type SampleField, type SampleKind, type Side } from '../../schemas/sample'
import type { CellValue } from '../../schemas/sheet'
import { parseNumber } from '../typedNumber'
import { plainWords } from './columns'

export interface SideNames { sideAName: string, sideBName: string }
export type ReadCell = { value: CellValue } | { sentence: string }

const kindWords: Record<SampleKind, readonly string[]> = {
  sample: ['', 'sample', 'samples', 's', 'unknown', 'study sample'],
  solventBlank: ['solvent blank', 'solventblank', 'blank', 'solvent', 'instrument blank', 'blk'],
  processBlank: ['process blank', 'processblank', 'procedural blank', 'procedure blank', 'method blank', 'extraction blank', 'preparation blank', 'prep blank'],
  pooledQc: ['pooled qc', 'pooledqc', 'qc', 'pool', 'pooled', 'qc pool', 'quality control'],
  standard: ['standard', 'standards', 'std', 'reference standard', 'standard mix'],
}
const unitWords: Record<AmountUnit, readonly string[]> = { mg: ['', 'mg', 'milligram', 'milligrams'], mL: ['ml', 'millilitre', 'millilitres', 'milliliter', 'milliliters'] }
const ownUnits: Partial<Record<SampleField, RegExp>> = { volumeMl: /\s*ml$/i, injectionUl: /\s*[uµμ]l$/i }

/** What a person wrote into a cell of the sample sheet as its value, or a sentence about what is wrong with it. Kinds and sides may be words. */
export function readCell(field: SampleField, text: string, names: SideNames): ReadCell {
  const value = meaning(field, text, names)
  if (value === undefined) return { sentence: notUnderstood(field, names) }
  const result = sampleSchema.shape[field].safeParse(value)
  return result.success ? { value: result.data } : { sentence: result.error.issues[0]?.message ?? notUnderstood(field, names) }
}

/** "12.5 mg" in the amount column means an amount and its unit. */
export function splitAmount(text: string): { amount: string, unit: AmountUnit } | null {
  const match = /^\s*(?<amount>[\d.,\se+-]*\d[\d.,]*)\s*(?<unit>mg|ml)\s*$/i.exec(text)
  const { amount, unit } = match?.groups ?? {}
  return amount && unit ? { amount: amount.trim(), unit: unit.toLowerCase() === 'mg' ? 'mg' : 'mL' } : null
}

/** undefined where nothing can be made of the text. */
function meaning(field: SampleField, text: string, names: SideNames): CellValue | undefined {
  switch (field) {
    case 'name': case 'preparation': case 'batch': return text.trim()
    case 'kind': return wordOf(kindWords, text)
    case 'amountUnit': return wordOf(unitWords, text)
    case 'side': return sideOf(text, names)
    default: return parseNumber(text.trim().replace(ownUnits[field] ?? '', ''))
  }
}

function wordOf<T extends string>(words: Record<T, readonly string[]>, text: string): T | undefined {
  const said = plainWords(text)
  return (Object.keys(words) as T[]).find(each => words[each].includes(said))
}

function sideOf(text: string, { sideAName, sideBName }: SideNames): Side | null | undefined {
  const said = text.trim().toLowerCase()
  if (['', '-', '–', 'none'].includes(said)) return null
  if (said === sideAName.trim().toLowerCase()) return 'A'
  if (said === sideBName.trim().toLowerCase()) return 'B'
  const letter = plainWords(text).replace(/^side /, '')
  return letter === 'a' ? 'A' : letter === 'b' ? 'B' : undefined
}

function notUnderstood(field: SampleField, { sideAName, sideBName }: SideNames): string {
  switch (field) {
    case 'kind': return 'Not a kind: sample, solvent blank, process blank, pooled QC or standard.'
    case 'side': return `Not a side: A${sideAName === 'A' ? '' : ` (${sideAName})`}, B${sideBName === 'B' ? '' : ` (${sideBName})`} or empty.`
    case 'amountUnit': return 'Not a unit: mg or mL.'
    case 'dilution': return 'Not a number. Give the factor: 10 for one part made up to ten.'
    default: return 'Not a number. Use digits with a point or a comma.'
  }
}
