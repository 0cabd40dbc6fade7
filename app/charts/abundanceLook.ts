import { textWidth, TEXT_SIZE, type DrawnShape, type Ink, type MarkShape } from '~/charts/drawing'
import { groupLook } from '~/charts/groupLook'
import type { SampleGroup, SampleValue } from '~/charts/sampleValues'
import { formatIntensity } from '~/utils/formatMeasures'

export const MARK_SIZE = 4
export const ESTIMATED_DASH = '3 2'

/** A sample under the pointer, in words. */
export function sampleSays(value: SampleValue): string {
  const floor = value.floor > 0 ? `${formatIntensity(value.floor)}, ${value.floorSource}` : 'not known'
  const found = value.value > 0 ? formatIntensity(value.value) : 'not found'
  return `${value.name}: ${found}. Floor: ${floor}.`
}

interface LegendItem { text: string, shape?: MarkShape, hollow?: boolean, ink: Ink, dash?: string | null }

/** The signs that a drawing of these samples uses, each with its word, in lines of at most `width`. */
export function legend(values: readonly SampleValue[], labels: Record<SampleGroup, string>, width: number, top: number): { shapes: DrawnShape[], height: number } {
  const groups = [...new Set(values.map(({ group }) => group))]
  const items: LegendItem[] = groups.map(group => ({ text: labels[group], ...groupLook[group] }))
  if (values.some(({ value }) => !(value > 0))) items.push({ text: 'hollow, at the floor: not found', shape: 'circle', hollow: true, ink: 'muted' })
  for (const source of ['stated', 'estimated'] as const) {
    if (values.some(({ floor, floorSource }) => floor > 0 && floorSource === source)) items.push({ text: `floor, ${source}`, ink: 'muted', dash: source === 'estimated' ? ESTIMATED_DASH : null })
  }
  const LINE = 18
  const shapes: DrawnShape[] = []
  let x = 0
  let y = top + LINE / 2
  for (const { text, shape, hollow, ink, dash } of items) {
    const room = 18 + textWidth(text) + 16
    if (x > 0 && x + room > width) {
      x = 0
      y += LINE
    }
    if (shape) shapes.push({ kind: 'mark', shape, x: x + 6, y, ink, hollow })
    else shapes.push({ kind: 'line', d: `M${x} ${y}h12`, ink, weight: 1.5, ...(dash ? { dash } : {}) })
    shapes.push({ kind: 'text', x: x + 18, y: y + 4, text, ink: 'muted', size: TEXT_SIZE })
    x += room
  }
  return { shapes, height: items.length > 0 ? y + LINE / 2 - top : 0 }
}

