import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { groupLook } from '~/charts/groupLook'
import { fitText, round, type Drawing, type DrawnShape } from '~/charts/drawing'
import { logScale } from '~/charts/logScale'
import { groupLabels, isFound, type SampleGroup, type SampleValue } from '~/charts/sampleValues'

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

export interface SampleDots { width: number, height: number, rows: DotRow[], ticks: { x: number, label: string }[] }

const WIDTH = 340
const LEFT = 92
const RIGHT = 44
const ROW = 30
const FOOT = 20

/** Lays out a small dot plot, one row a group, on one log axis that holds every value and floor. */
export function sampleDots(values: readonly SampleValue[], names: SideNames): SampleDots {
  const scale = logScale(values.flatMap(({ value, floor }) => [value, floor]), LEFT, WIDTH - RIGHT)
  const groups = [...new Set(values.map(({ group }) => group))]
  const rows = groups.map((group, at): DotRow => {
    const own = values.filter(value => value.group === group)
    const y = at * ROW + ROW / 2
    const floors = own.map(({ floor }) => floor)
    const found = own.filter(isFound)
    return {
      group, label: groupLabels(names)[group], y,
      dots: found.map(({ value, name }, place) => ({ x: scale.at(value), y: y + (found.length > 1 ? (place % 3 - 1) * 5 : 0), name })),
      floorX: floors.length > 0 && floors.every(floor => floor > 0) ? scale.at(Math.max(...floors)) : null,
      notFound: own.length - found.length,
    }
  })
  return { width: WIDTH, height: rows.length * ROW + FOOT, rows, ticks: scale.ticks.map(({ at, label }) => ({ x: at, label })) }
}

/** The dot plot as a drawing. */
export function dotsDrawing({ width, height, rows, ticks }: SampleDots): Drawing {
  const shapes = ticks.flatMap(({ x, label }): DrawnShape[] => [
    { kind: 'line', d: `M${round(x)} 0V${height - 18}`, ink: 'hairline' },
    { kind: 'text', x: round(x), y: height - 5, text: label, ink: 'muted', anchor: 'middle', size: 11 },
  ])
  for (const { group, label, y, floorX, dots, notFound } of rows) {
    const { shape, ink } = groupLook[group]
    shapes.push({ kind: 'text', x: 0, y: y + 4, text: fitText(label, LEFT - 4), ink: group === 'A' || group === 'B' ? ink : 'muted', says: label })
    if (floorX !== null) shapes.push({ kind: 'line', d: `M${round(floorX)} ${y - 12}v24`, ink, weight: 1.5, dash: '3 2' })
    for (const dot of dots) shapes.push({ kind: 'mark', shape, x: round(dot.x), y: dot.y, ink, size: 3.5, says: dot.name })
    if (notFound > 0) shapes.push({ kind: 'text', x: width, y: y + 4, text: `${notFound} not`, ink: 'muted', anchor: 'end', size: 11 })
  }
  return { width, height, shapes }
}

/** The dot plot in words. */
export function sampleDotsText(values: readonly SampleValue[], names: SideNames, format: (value: number) => string): string {
  const groups = [...new Set(values.map(({ group }) => group))]
  return groups.map((group) => {
    const own = values.filter(value => value.group === group)
    const found = own.flatMap(({ value }) => value > 0 ? [value] : [])
    const range = found.length === 0 ? '' : found.length === 1 ? `, ${format(found[0] ?? 0)}` : `, ${format(Math.min(...found))} to ${format(Math.max(...found))}`
    return `${groupLabels(names)[group]}: found in ${found.length} of ${own.length}${range}.`
  }).join(' ')
}
