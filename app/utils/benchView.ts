import { flagKinds, type FlagKind } from '#shared/schemas/flag'
import type { FeaturesPresent } from '#shared/science/components/chooseFeatures'
import { COMPONENT_SCALINGS, type ComponentScaling } from '#shared/science/components/scaleFeatures'
import { COUNTED_VERDICTS, type Verdict } from '#shared/science/verdict/verdicts'
import { DEFAULT_LAYOUT, readLayout, writeLayout, type ColumnLayout } from '~/utils/columnLayout'
import { readGroups, readPair, readPresent, writeGroups, writePair, writePresent, type ComponentPair, type FurtherGroup } from '~/utils/componentsView'
import { MOST_SORTS, SORT_KEYS, type FeatureSort } from '~/utils/featureOrder'
import { readFormula, readMass, writeFormula, writeMass, type FormulaTarget, type MassTarget } from '~/utils/massTarget'
import { OPEN_RANGE, readRange, writeRange, type NumberRange } from '~/utils/numberRange'
import { readArea, writeArea, type PlotArea } from '~/utils/plotArea'
import { readWindow, writeWindow, type PlotWindow } from '~/utils/plotWindow'
import { RANGE_FILTERS, RANGE_NAMES, type RangeName } from '~/utils/rangeFilters'
import { readTimeWindow, TRACE_KINDS, TRACE_ORIGINS, TRACE_SCALES, writeTimeWindow, type TimeWindow, type TraceKind, type TraceOrigin, type TraceScale } from '~/utils/traceView'

/** One part of what the bench shows, and how the address holds it: undefined where it stands as by default. */
export interface ViewField<Value> {
  initial: Value
  /** Its name in the query. */
  key: string
  /** `text` is not empty; whatever a person made of it. Undefined: no such value. */
  read: (text: string) => Value | undefined
  write: (value: Value) => string
  /** A change of it is a step that "back" takes back; moving from feature to feature and typing are none. */
  isStep: boolean
  /** It decides which features are shown; "clear the filter" sets it back. */
  isFilter?: true
}

/** Features with or without flags; with any flag; with a flag of one kind. */
export type FlagFilter = 'all' | 'flagged' | FlagKind

/** What the large plot of the bench draws. */
export const PLOTS = ['fold', 'components', 'abundance'] as const
export type Plot = (typeof PLOTS)[number]

/** How the abundance plot lays its samples out. */
export const ABUNDANCE_LAYOUTS = ['preparation', 'run'] as const
export type AbundanceLayout = (typeof ABUNDANCE_LAYOUTS)[number]
/** Which signal it draws: in the comparison's normalised counts, or as each table states it. */
export const SIGNALS = ['normalised', 'injected'] as const
export type Signal = (typeof SIGNALS)[number]

/** So many features can be picked beside the selected one and stand in the address. */
export const MOST_PICKED = 100

const field = <Value>(each: ViewField<Value>) => each
/** A field that holds one of a few words, which stand in the address as they are. */
const oneOf = <Value extends string>(words: readonly Value[], each: Omit<ViewField<Value>, 'read' | 'write'>): ViewField<Value> => ({ ...each, read: text => words.find(word => word === text), write: word => word })

/** A field that holds places, ascending; numbered from 1 in the address, as on the page. */
const places = (each: Omit<ViewField<number[]>, 'read' | 'write'>, most: number): ViewField<number[]> => ({
  ...each,
  read: text => [...new Set(text.split('.').flatMap(number => featureNumber(number) ?? []))].sort((a, b) => a - b).slice(0, most),
  write: value => value.map(place => place + 1).join('.'),
})

/** All that the address holds of the bench, so that a copied link opens it again. A new part is one more field here. */
export const viewFields = {
  /** Place of the selected feature in the alignment; numbered from 1 in the address, as on the page. */
  selected: field<number | null>({ initial: null, key: 'feature', isStep: false, read: featureNumber, write: value => value === null ? '' : String(value + 1) }),
  /** Features looked at beside the selected one, in ascending order. */
  picked: places({ initial: [], key: 'also', isStep: false }, MOST_PICKED),
  verdicts: field<Verdict[]>({ initial: [], key: 'verdict', isStep: true, isFilter: true, write: value => COUNTED_VERDICTS.filter(name => value.includes(name)).join('.'), read: (text) => {
    const named = text.split('.')
    return COUNTED_VERDICTS.filter(name => named.includes(name))
  } }),
  flags: oneOf<FlagFilter>(['all', 'flagged', ...flagKinds], { initial: 'all', key: 'flags', isStep: true, isFilter: true }),
  find: field<string>({ initial: '', key: 'find', isStep: false, isFilter: true, read: text => text.slice(0, 200), write: value => value }),
  massPpm: field<number>({ initial: 10, key: 'ppm', isStep: false, read: text => Number(text) > 0 && Number(text) <= 10_000 ? Number(text) : undefined, write: String }),
  abundanceLayout: oneOf<AbundanceLayout>(ABUNDANCE_LAYOUTS, { initial: 'preparation', key: 'samples', isStep: true }),
  signal: oneOf<Signal>(SIGNALS, { initial: 'normalised', key: 'signal', isStep: true }),
  /** m/z within so many ppm; m/z of the usual ions of a neutral mass, and of a formula. */
  mzNear: field<MassTarget | null>({ initial: null, key: 'mz', isStep: true, isFilter: true, read: readMass, write: writeMass }),
  massNear: field<MassTarget | null>({ initial: null, key: 'mass', isStep: true, isFilter: true, read: readMass, write: writeMass }),
  formula: field<FormulaTarget | null>({ initial: null, key: 'formula', isStep: true, isFilter: true, read: readFormula, write: writeFormula }),
  ...rangeFields(),
  /** Never empty; the first foremost. */
  sort: field<FeatureSort[]>({ initial: [{ key: 'intensity', descending: true }], key: 'sort', isStep: true, read: sortsOf, write: value => value.map(({ key, descending }) => `${descending ? '-' : ''}${key}`).join('.') }),
  /** Columns of the feature table, from the left. */
  columns: field<ColumnLayout>({ initial: DEFAULT_LAYOUT, key: 'columns', isStep: false, read: readLayout, write: writeLayout }),
  plot: oneOf<Plot>(PLOTS, { initial: 'fold', key: 'plot', isStep: true }),
  /** The features inside an area drawn on the fold-change plot; null: all. */
  area: field<PlotArea | null>({ initial: null, key: 'area', isStep: true, isFilter: true, read: readArea, write: writeArea }),
  /** The part of the plot of ratios that is shown; null: all of it. */
  foldWindow: field<PlotWindow | null>({ initial: null, key: 'window', isStep: false, read: readWindow, write: writeWindow }),
  /** Every plot shows the surroundings of the selected feature, and follows it. */
  closeUp: field<boolean>({ initial: false, key: 'close', isStep: false, read: text => text === 'yes' ? true : undefined, write: value => value ? 'yes' : '' }),
  /** Principal components: the two that are drawn, the scaling, the features and the samples that take part beside the sides. */
  componentPair: field<ComponentPair>({ initial: { across: 1, upwards: 2 }, key: 'pc', isStep: true, read: readPair, write: writePair }),
  componentScaling: oneOf<ComponentScaling>(COMPONENT_SCALINGS, { initial: 'none', key: 'scale', isStep: true }),
  componentFeatures: field<FeaturesPresent>({ initial: 'oneSide', key: 'in', isStep: true, read: readPresent, write: writePresent }),
  componentGroups: field<FurtherGroup[]>({ initial: ['pooledQc'], key: 'with', isStep: true, read: readGroups, write: writeGroups }),
  /** Samples left out of them one by one, by their place in the comparison. */
  componentWithout: places({ initial: [], key: 'without', isStep: true }, 1000),
  traceKind: oneOf<TraceKind>(TRACE_KINDS, { initial: 'base', key: 'trace', isStep: true }),
  traceScale: oneOf<TraceScale>(TRACE_SCALES, { initial: 'normalised', key: 'tscale', isStep: true }),
  traceOrigin: oneOf<TraceOrigin>(TRACE_ORIGINS, { initial: 'measured', key: 'tfrom', isStep: true }),
  /** The part of the run that the chromatogram shows; null: all of it. */
  traceWindow: field<TimeWindow | null>({ initial: null, key: 'tmin', isStep: false, read: readTimeWindow, write: writeTimeWindow }),
}

type Fields = typeof viewFields
export type BenchView = { [Name in keyof Fields]: Fields[Name]['initial'] }
export type Query = Record<string, string | undefined>

const entries = Object.entries(viewFields) as [keyof Fields, ViewField<unknown>][]

/** The view as the bench opens; a copy, so that nobody changes the next one's. */
export function initialView(): BenchView {
  return structuredClone(Object.fromEntries(entries.map(([name, { initial }]) => [name, initial]))) as BenchView
}

/** The view as a query; what stands as by default is left out. */
export function viewToQuery(view: BenchView): Query {
  return Object.fromEntries(entries.map(([name, { initial, key, write }]) => {
    const text = write(view[name])
    return [key, text === '' || text === write(initial) ? undefined : text]
  }))
}

/** Reads a query, whatever a person made of it; what is no view stands as by default. */
export function queryToView(query: Record<string, unknown>): BenchView {
  const view = initialView()
  for (const [name, { key, read }] of entries) {
    const text = query[key]
    const value = typeof text === 'string' && text !== '' ? read(text) : undefined
    if (value !== undefined) Object.assign(view, { [name]: value })
  }
  return view
}

const FILTERS = entries.filter(([, { isFilter }]) => isFilter)

/** Do filters stand that take features away? */
export function isFilteredView(view: BenchView): boolean {
  return FILTERS.some(([name, { initial, write }]) => write(view[name]) !== write(initial))
}

/** Every filter as it opens. */
export function withoutFilter(): Partial<BenchView> {
  return structuredClone(Object.fromEntries(FILTERS.map(([name, { initial }]) => [name, initial])))
}

/** What of a view makes a step of the history, as one text. */
export function stepsOf(view: BenchView): string {
  return JSON.stringify(entries.filter(([, { isStep }]) => isStep).map(([name]) => view[name]))
}

function featureNumber(text: string): number | undefined {
  return /^[1-9]\d{0,8}$/.test(text) ? Number(text) - 1 : undefined
}

function rangeFields(): Record<RangeName, ViewField<NumberRange>> {
  return Object.fromEntries(RANGE_NAMES.map(name => [name, field<NumberRange>({ initial: { ...OPEN_RANGE }, key: RANGE_FILTERS[name].key, isStep: true, isFilter: true, read: readRange, write: writeRange })])) as Record<RangeName, ViewField<NumberRange>>
}

function sortsOf(text: string): FeatureSort[] | undefined {
  const sorts = new Map<FeatureSort['key'], FeatureSort>()
  for (const part of text.split('.')) {
    const descending = part.startsWith('-')
    const key = SORT_KEYS.find(name => name === part.slice(descending ? 1 : 0))
    if (key && !sorts.has(key)) sorts.set(key, { key, descending })
  }
  return sorts.size > 0 ? [...sorts.values()].slice(0, MOST_SORTS) : undefined
}
