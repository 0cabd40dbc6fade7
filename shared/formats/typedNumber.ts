/** A number as people type it, with a comma or a point as decimal mark; null for nothing, undefined for what is no number. */
export function parseNumber(text: string): number | null | undefined {
  const trimmed = text.trim().replaceAll(/[\s\u00A0\u202F]/g, '')
  if (trimmed === '') return null
  if (!/^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i.test(trimmed)) return undefined
  const value = Number(trimmed.replace(',', '.'))
  return Number.isFinite(value) ? value : undefined
}
