import type { SampleGroup, SampleValue } from '~/charts/sampleValues'

export interface DotRow {
  group: SampleGroup
  label: string
  /** Middle of the row. */
  y: number
  dots: { x: number, y: number, name: string }[]
  /** Highest floor of the row's samples; null where it is not known. */
  floorX: number | null
  notFound: number
}

export interface SampleDots { width: number, height: number, rows: DotRow[], ticks: { x: number, exponent: number }[] }

const WIDTH = 340
const LEFT = 92
const RIGHT = 44
const ROW = 30
const FOOT = 20

const labels = (names: { a: string, b: string }): Record<SampleGroup, string> => ({
  A: names.a, B: names.b, blank: 'blanks', pooledQc: 'pooled QCs', standard: 'standards', notCompared: 'not compared',
})

/** Lays out a small dot plot, one row a group, on one log axis that holds every value and floor. */
export function sampleDots(values: readonly SampleValue[], names: { a: string, b: string }): SampleDots {
  const known = values.flatMap(({ value, floor }) => [value, floor]).filter(value => value > 0)
  const low = known.length > 0 ? Math.log10(Math.min(...known)) - 0.15 : 0
  const high = known.length > 0 ? Math.max(low + 0.6, Math.log10(Math.max(...known)) + 0.15) : 1
  const across = (value: number) => LEFT + (Math.log10(value) - low) / (high - low) * (WIDTH - LEFT - RIGHT)
  const groups = [...new Set(values.map(({ group }) => group))]
  const rows = groups.map((group, at): DotRow => {
    const own = values.filter(value => value.group === group)
    const y = at * ROW + ROW / 2
    const floors = own.map(({ floor }) => floor)
    const found = own.filter(({ value }) => value > 0)
    return {
      group, label: labels(names)[group], y,
      dots: found.map(({ value, name }, place) => ({ x: across(value), y: y + (found.length > 1 ? (place % 3 - 1) * 5 : 0), name })),
      floorX: floors.length > 0 && floors.every(floor => floor > 0) ? across(Math.max(...floors)) : null,
      notFound: own.length - found.length,
    }
  })
  const ticks = []
  for (let exponent = Math.ceil(low); exponent <= high; exponent++) ticks.push({ x: across(10 ** exponent), exponent })
  return { width: WIDTH, height: rows.length * ROW + FOOT, rows, ticks }
}

/** The dot plot in words. */
export function sampleDotsText(values: readonly SampleValue[], names: { a: string, b: string }, format: (value: number) => string): string {
  const groups = [...new Set(values.map(({ group }) => group))]
  return groups.map((group) => {
    const own = values.filter(value => value.group === group)
    const found = own.flatMap(({ value }) => value > 0 ? [value] : [])
    const range = found.length === 0 ? '' : found.length === 1 ? `, ${format(found[0] ?? 0)}` : `, ${format(Math.min(...found))} to ${format(Math.max(...found))}`
    return `${labels(names)[group]}: found in ${found.length} of ${own.length}${range}.`
  }).join(' ')
}
