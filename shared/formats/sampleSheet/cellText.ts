import { sampleKindNames, type SampleField, type SampleKind } from '../../schemas/sample'
import type { CellValue } from '../../schemas/sheet'

/** A cell as the sheet shows and copies it; readCell gives the value back. */
export function cellText(field: SampleField, value: CellValue): string {
  if (value === null) return ''
  if (field === 'kind') return sampleKindNames[value as SampleKind]
  return String(value)
}
