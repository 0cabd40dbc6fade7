import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { ESTIMATED_DASH, legend, MARK_SIZE, sampleSays } from '~/charts/abundanceLook'
import { groupLook } from '~/charts/groupLook'
import { fitText, round, textWidth, type Drawing, type DrawnShape } from '~/charts/drawing'
import { logScale, type LogScale } from '~/charts/logScale'
import { groupLabels, isFound, type SampleGroup, type SampleValue } from '~/charts/sampleValues'
import type { SideMean } from '~/charts/sideMeans'
import type { Signal } from '~/utils/benchView'
import { formatTimes } from '~/utils/formatStatistics'
import { formatIntensity } from '~/utils/formatMeasures'

export interface AbundanceInput {
  /** Of the signal that is drawn. */
  values: readonly SampleValue[]
  means: readonly SideMean[]
  names: SideNames
  signal: Signal
  /** Pixels. */
  width: number
}

export const signalAxis: Readonly<Record<Signal, string>> = { normalised: 'intensity, counts, normalised', injected: 'intensity, counts as injected' }

const HEAD = 24
const GAP = 10

/** The samples of a feature, a row a preparation, on one log axis: side A, side B with their means, then blanks, QCs and standards. */
export function abundanceRows({ values, means, names, signal, width }: AbundanceInput): Drawing {
  const labels = groupLabels(names)
  const left = Math.min(150, Math.round(width * 0.3))
  const right = signal === 'normalised' ? 52 : 12
  const scale = logScale([...values.flatMap(({ value, floor }) => [value, floor]), ...means.map(({ log2 }) => 2 ** log2)], left, Math.max(left + 40, width - right))
  const row = values.length > 40 ? 16 : 22
  const shapes: DrawnShape[] = []
  let y = 0
  for (const group of new Set(values.map(each => each.group))) {
    const own = values.filter(value => value.group === group)
    const isSide = group === 'A' || group === 'B'
    if (isSide) {
      shapes.push({ kind: 'text', x: 0, y: y + 16, text: fitText(`${group} ${labels[group]}`, width), ink: groupLook[group].ink, strong: true })
      y += HEAD
    }
    for (const [label, injections] of byPreparation(own, isSide ? null : labels[group])) {
      shapes.push(...preparationRow(label, injections, group, { y: y + row / 2, row, left, width, scale, factors: signal === 'normalised' && isSide }))
      y += row
    }
    const mean = means.find(each => each.side === group)
    if (mean && mean.detected > 1) {
      shapes.push(...meanRow(mean, { y: y + row / 2, left, width, scale }))
      y += row
    }
    y += GAP
  }
  const bottom = y
  const axis: DrawnShape[] = scale.ticks.flatMap(({ at, label }): DrawnShape[] => [
    { kind: 'line', d: `M${round(at)} 0V${bottom}`, ink: 'hairline' },
    { kind: 'text', x: round(at), y: bottom + 14, text: label, ink: 'muted', anchor: 'middle' },
  ])
  axis.push({ kind: 'text', x: round((left + width - right) / 2), y: bottom + 32, text: signalAxis[signal], ink: 'muted', anchor: 'middle' })
  if (signal === 'normalised') axis.push({ kind: 'text', x: width, y: bottom + 14, text: 'factor', ink: 'muted', anchor: 'end' })
  const below = legend(values, labels, width, bottom + 42)
  return { width, height: bottom + 46 + below.height, shapes: [...axis, ...shapes, ...below.shapes] }
}

/** Injections by preparation, in their order; all in one row where `together` names it. */
function byPreparation(own: readonly SampleValue[], together: string | null): Map<string, SampleValue[]> {
  const rows = new Map<string, SampleValue[]>()
  for (const value of own) {
    const label = together ?? value.preparation
    rows.set(label, [...rows.get(label) ?? [], value])
  }
  return rows
}

interface RowPlace { y: number, left: number, width: number, scale: LogScale }

function preparationRow(label: string, injections: readonly SampleValue[], group: SampleGroup, { y, row, left, width, scale, factors }: RowPlace & { row: number, factors: boolean }): DrawnShape[] {
  const { shape, ink } = groupLook[group]
  const count = injections.length > 1 && (group === 'A' || group === 'B') ? ` (${injections.length} injections)` : ''
  const shapes: DrawnShape[] = [{ kind: 'text', x: 8, y: y + 4, text: fitText(label + count, left - 14), ink: 'ink', says: `${label}${count}: ${injections.map(({ name }) => name).join(', ')}` }]
  const floors = new Map(injections.filter(({ floor }) => floor > 0).map(value => [`${value.floor} ${value.floorSource}`, value]))
  for (const { floor, floorSource } of floors.values()) {
    shapes.push({ kind: 'line', d: `M${round(scale.at(floor))} ${y - row / 2 + 1}v${row - 2}`, ink, weight: 1.5, ...(floorSource === 'estimated' ? { dash: ESTIMATED_DASH } : {}), says: `Floor: ${formatIntensity(floor)}, ${floorSource}` })
  }
  const spread = injections.length > 1 ? Math.min(4, row / 2 - MARK_SIZE) : 0
  const found = injections.filter(isFound)
  const places = found.map((value, i) => ({ value, x: round(scale.at(value.value)), y: round(y + (i % 3 - 1) * spread) }))
  if (group === 'A' || group === 'B') {
    if (places.length > 1) shapes.push({ kind: 'line', d: `M${places.map(place => `${place.x} ${place.y}`).join('L')}`, ink })
  }
  for (const place of places) shapes.push({ kind: 'mark', shape, x: place.x, y: place.y, ink, size: MARK_SIZE, says: sampleSays(place.value) })
  shapes.push(...notFound(injections.filter(value => !isFound(value)), injections.length, group, { y, left, width, scale }))
  if (factors) shapes.push({ kind: 'text', x: width, y: y + 4, text: factorWord(injections), ink: 'muted', anchor: 'end' })
  return shapes
}

function factorWord(injections: readonly SampleValue[]): string {
  const words = [...new Set(injections.map(({ factor }) => formatTimes(factor)))]
  return words.length === 1 ? words[0] ?? '' : 'several'
}

/** What was not found stands hollow at its floor, with the word; where no floor is known, the word alone at the left. */
function notFound(missing: readonly SampleValue[], of: number, group: SampleGroup, { y, left, width, scale }: RowPlace): DrawnShape[] {
  if (missing.length === 0) return []
  const { shape, ink } = groupLook[group]
  const known = missing.filter(({ floor }) => floor > 0)
  const shapes = known.map((value): DrawnShape => ({ kind: 'mark', shape: shape === 'cross' ? 'circle' : shape, x: round(scale.at(value.floor)), y, ink, size: MARK_SIZE, hollow: true, says: sampleSays(value) }))
  const text = `${of > 1 ? `${missing.length} of ${of} ` : ''}not found${known.length === 0 ? ', floor not known' : ''}`
  const at = known.length > 0 ? Math.max(...known.map(({ floor }) => scale.at(floor))) + 8 : left + 4
  const fits = at + textWidth(text) < width - 52
  shapes.push({ kind: 'text', x: round(fits ? at : Math.min(...known.map(({ floor }) => scale.at(floor)), width) - 8), y: y + 4, text, ink: 'muted', anchor: fits ? 'start' : 'end' })
  return shapes
}

/** A side's mean with its 95 % interval; an end off the axis stays open. */
function meanRow({ side, detected, preparations, log2, interval }: SideMean, { y, left, scale }: RowPlace): DrawnShape[] {
  const { ink } = groupLook[side]
  const of = detected === preparations.length ? String(detected) : `${detected} of ${preparations.length}`
  const says = `Mean of ${of}: ${formatIntensity(2 ** log2)}${interval ? `, 95 % interval ${formatIntensity(2 ** interval[0])} to ${formatIntensity(2 ** interval[1])}` : ''}`
  const shapes: DrawnShape[] = [{ kind: 'text', x: 8, y: y + 4, text: fitText(`mean of ${of}`, left - 14), ink, says }]
  if (interval) {
    const [low, high] = interval.map(end => ({ x: round(scale.at(2 ** end)), closed: scale.holds(2 ** end) }))
    if (low && high) shapes.push({ kind: 'line', d: `M${low.x} ${y}H${high.x}${[low, high].filter(end => end.closed).map(end => `M${end.x} ${y - 4}v8`).join('')}`, ink, weight: 1.5, says })
  }
  shapes.push({ kind: 'line', d: `M${round(scale.at(2 ** log2))} ${y - 8}v16`, ink, weight: 3, says })
  return shapes
}
