import { ESTIMATED_DASH, legend, MARK_SIZE, sampleSays } from '~/charts/abundanceLook'
import { groupLook } from '~/charts/groupLook'
import { signalAxis, type AbundanceInput } from '~/charts/abundanceRows'
import { fitText, round, type Drawing, type DrawnShape } from '~/charts/drawing'
import { logScale, type LogScale } from '~/charts/logScale'
import { groupLabels, isFound, type SampleValue } from '~/charts/sampleValues'

/** Samples of one batch, in the order they ran. */
export interface Batch { name: string | null, runs: SampleValue[] }

/** Samples by batch, in run order; those without a run order apart. Batches follow each other by their first run, then by name. */
export function runBatches(values: readonly SampleValue[]): { batches: Batch[], without: SampleValue[] } {
  const byName = new Map<string | null, SampleValue[]>()
  for (const value of values) {
    if (value.runOrder !== null) byName.set(value.batch, [...byName.get(value.batch) ?? [], value])
  }
  const batches = [...byName].map(([name, runs]) => ({ name, runs: runs.toSorted((a, b) => runOf(a) - runOf(b) || (a.name < b.name ? -1 : 1)) }))
  batches.sort((a, b) => firstRun(a) - firstRun(b) || ((a.name ?? '') < (b.name ?? '') ? -1 : 1))
  return { batches, without: values.filter(({ runOrder }) => runOrder === null) }
}
const runOf = ({ runOrder }: SampleValue) => runOrder ?? 0
const firstRun = ({ runs }: Batch) => runs[0] ? runOf(runs[0]) : 0

const LEFT = 62
const RIGHT = 12
const TOP = 26
const PLOT = 260
const GAP = 14

/** The feature over the run: every injection in its order, QCs and blanks among them, and the floor of each table as a line of steps. */
export function abundanceRun({ values, names, signal, width }: Omit<AbundanceInput, 'means'>): Drawing {
  const { batches } = runBatches(values)
  const drawn = batches.flatMap(({ runs }) => runs)
  if (drawn.length === 0) return { width, height: 0, shapes: [] }
  const bottom = TOP + PLOT
  const scale = logScale(drawn.flatMap(({ value, floor }) => [value, floor]), bottom, TOP)
  const slot = Math.max(0.5, (width - LEFT - RIGHT - GAP * (batches.length - 1)) / drawn.length)
  const shapes: DrawnShape[] = scale.ticks.flatMap(({ at, label }): DrawnShape[] => [
    { kind: 'line', d: `M${LEFT} ${round(at)}H${width - RIGHT}`, ink: 'hairline' },
    { kind: 'text', x: LEFT - 6, y: round(at + 4), text: label, ink: 'muted', anchor: 'end' },
  ])
  shapes.push({ kind: 'text', x: 12, y: round((TOP + bottom) / 2), text: signalAxis[signal], ink: 'muted', anchor: 'middle', turned: true })
  let x = LEFT
  batches.forEach(({ name, runs }, b) => {
    const end = x + slot * runs.length
    if (b > 0) shapes.push({ kind: 'line', d: `M${round(x - GAP / 2)} 0V${bottom}`, ink: 'muted', dash: '1 3' })
    if (name !== null || batches.length > 1) shapes.push({ kind: 'text', x: round(x), y: 12, text: fitText(name === null ? 'no batch stated' : `batch ${name}`, Math.max(24, end - x)), ink: 'muted', says: name ?? 'no batch stated' })
    const start = x
    const places = runs.map((value, i) => ({ value, from: start + i * slot, x: round(start + (i + 0.5) * slot) }))
    shapes.push(...floorSteps(places, slot, scale), ...runMarks(places, slot, scale), ...runNumbers(places, bottom))
    x = end + GAP
  })
  shapes.push({ kind: 'text', x: round((LEFT + width - RIGHT) / 2), y: bottom + 34, text: 'run order', ink: 'muted', anchor: 'middle' })
  const below = legend(drawn, groupLabels(names), width, bottom + 42)
  return { width, height: bottom + 46 + below.height, shapes: [...shapes, ...below.shapes] }
}

interface Place { value: SampleValue, from: number, x: number }

/** One line a run of floors of the same source; it breaks where a floor is not known. */
function floorSteps(places: readonly Place[], slot: number, scale: LogScale): DrawnShape[] {
  const lines: { d: string, dashed: boolean }[] = []
  let before: Place | null = null
  for (const place of places) {
    const { floor, floorSource } = place.value
    if (!(floor > 0)) {
      before = null
      continue
    }
    const step = `${before ? 'V' : `M${round(place.from)} `}${round(scale.at(floor))}H${round(place.from + slot)}`
    const last = lines.at(-1)
    if (before?.value.floorSource === floorSource && last) last.d += step
    else lines.push({ d: before ? `M${round(place.from)} ${round(scale.at(floor))}H${round(place.from + slot)}` : step, dashed: floorSource === 'estimated' })
    before = place
  }
  return lines.map(({ d, dashed }) => ({ kind: 'line', d, ink: 'muted', ...(dashed ? { dash: ESTIMATED_DASH } : {}) }))
}

function runMarks(places: readonly Place[], slot: number, scale: LogScale): DrawnShape[] {
  const size = round(Math.max(1.5, Math.min(MARK_SIZE, slot / 2)))
  return places.flatMap(({ value, x }): DrawnShape[] => {
    const { shape, ink } = groupLook[value.group]
    const says = `${sampleSays(value)} Run ${runOf(value)}${value.batch === null ? '' : `, batch ${value.batch}`}.`
    if (isFound(value)) return [{ kind: 'mark', shape, x, y: round(scale.at(value.value)), ink, size, says }]
    const isFloorKnown = value.floor > 0
    const y = isFloorKnown ? round(scale.at(value.floor)) : TOP + PLOT
    const word: DrawnShape[] = slot >= 14 ? [{ kind: 'text', x: x + 4, y: y - 8, text: isFloorKnown ? 'not found' : 'not found, floor not known', ink: 'muted', turned: true, anchor: 'start', size: 11 }] : []
    return isFloorKnown ? [{ kind: 'mark', shape: shape === 'cross' ? 'circle' : shape, x, y, ink, size, hollow: true, says }, ...word] : word
  })
}

/** Run numbers under their marks, as many as there is room for. */
function runNumbers(places: readonly Place[], bottom: number): DrawnShape[] {
  let free = Number.NEGATIVE_INFINITY
  return places.flatMap(({ value, x }): DrawnShape[] => {
    const text = String(runOf(value))
    const half = Math.max(10, text.length * 4)
    if (x - half < free) return []
    free = x + half
    return [{ kind: 'text', x, y: bottom + 16, text, ink: 'muted', anchor: 'middle' }]
  })
}
