import { sampleKindNames } from '../../../shared/schemas/sample'
import type { ComparedSample } from '../../../shared/science/verdict/settings'

const number = (value: number | null, unit: string) => value === null ? 'empty' : `${value}${unit}`

/** What of a sample a comparison rests on, in words; side apart, since it may be chosen by hand. */
const FIELDS: readonly [name: string, of: (sample: ComparedSample) => string][] = [
  ['name', sample => sample.name],
  ['kind', sample => sampleKindNames[sample.kind]],
  ['preparation', sample => sample.preparation || 'empty'],
  ['amount', sample => number(sample.amount, ` ${sample.amountUnit ?? ''}`)],
  ['volume', sample => number(sample.volumeMl, ' mL')],
  ['dilution', sample => number(sample.dilution, '')],
  ['injection volume', sample => number(sample.injectionUl, ' µL')],
  ['run order', sample => number(sample.runOrder, '')],
  ['batch', sample => sample.batch ?? 'empty'],
  ['peak limit', sample => sample.floorSource === 'stated' ? String(sample.floor) : 'not stated'],
]
const SIDE: (typeof FIELDS)[number] = ['side', sample => sample.side ?? 'none']

/** What differs between the samples of two snapshots, as sentences; sides chosen by hand before count only where `handSides`. */
export function sampleDifferences(before: readonly ComparedSample[], after: readonly ComparedSample[], { handSides }: { handSides: boolean }): string[] {
  const byId = new Map(after.map(sample => [sample.id, sample]))
  const known = new Set(before.map(sample => sample.id))
  return [
    ...before.flatMap((was) => {
      const now = byId.get(was.id)
      if (!now) return [`${was.name} is no longer there.`]
      const fields = was.sideByHand && !handSides ? FIELDS : [SIDE, ...FIELDS]
      return fields.flatMap(([name, of]) => of(was) === of(now) ? [] : [`${was.name}: ${name} ${of(was)} → ${of(now)}.`])
    }),
    ...after.flatMap(now => known.has(now.id) ? [] : [`${now.name} is new.`]),
  ]
}
