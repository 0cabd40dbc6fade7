import { threeDigits, times } from '#shared/science/numeric/numberWords'
import { comparisonDefaults, type ComparisonSettings } from '#shared/science/verdict/settings'
import { formatIntensity } from '~/utils/formatMeasures'

/** One limit of a comparison as a person sets it: a sentence, a field in the unit people think in, and where the default comes from. */
export interface SettingField {
  id: 'blankRatio' | 'presence' | 'reachLimit' | 'foldLimit' | 'alpha' | 'assumedCvPercent' | 'intensityLimit'
  label: string
  unit?: string
  sentence: (settings: ComparisonSettings) => string
  source: string
  /** From the setting to what the field shows, and back; null where the limit is off. */
  shown: (settings: ComparisonSettings) => number | null
  /** Undefined: not a value this limit can take. */
  set: (value: number | null) => Partial<ComparisonSettings> | undefined
  range: string
}

const within = (low: number, high: number, make: (value: number) => Partial<ComparisonSettings>) => (value: number | null) => value !== null && value >= low && value <= high ? make(value) : undefined
const fold = (settings: ComparisonSettings) => times(2 ** settings.foldLimit)

export const settingFields: readonly SettingField[] = [
  {
    id: 'foldLimit', label: 'Fold limit', unit: '×', range: 'From 1 to 1000.',
    sentence: s => `A feature is more on one side where its levels differ at least ${fold(s)}; it is level where they are shown to lie within ${fold(s)}.`,
    source: 'Default ×2, common practice.',
    shown: s => Number(threeDigits(2 ** s.foldLimit)), set: within(1, 1000, value => ({ foldLimit: Math.log2(value) })),
  },
  {
    id: 'alpha', label: 'Alpha', range: 'From 0.000001 to 0.5.',
    sentence: s => `Of the features called more, at most ${threeDigits(s.alpha * 100)} % may be so by chance (q ≤ ${s.alpha}).`,
    source: 'Default 0.05, common practice; false discovery rate after Benjamini and Hochberg 1995.',
    shown: s => s.alpha, set: within(1e-6, 0.5, alpha => ({ alpha })),
  },
  {
    id: 'reachLimit', label: 'Reach limit', unit: '×', range: 'From 1 to 1000.',
    sentence: s => `A feature is found only on one side where it stands at least ${times(s.reachLimit)} above the highest floor of the other; else the other could not have shown it.`,
    source: 'Default ×3, common practice.',
    shown: s => s.reachLimit, set: within(1, 1000, reachLimit => ({ reachLimit })),
  },
  {
    id: 'presence', label: 'Presence', unit: '%', range: 'From 1 to 100.',
    sentence: s => `A side holds a feature where at least ${threeDigits(s.presence * 100)} % of its preparations show it; below that it is patchy.`,
    source: 'Default 80 %, after Yang 2015.',
    shown: s => Number(threeDigits(s.presence * 100)), set: within(1, 100, value => ({ presence: value / 100 })),
  },
  {
    id: 'blankRatio', label: 'Blank ratio', unit: '×', range: 'From 1 to 1000.',
    sentence: s => `A feature is set aside as blank-borne where no side reaches ${times(s.blankRatio)} the blanks.`,
    source: 'Default ×5; no standard fixes it (FDA 2018 implies 5, SANTE 3.3).',
    shown: s => s.blankRatio, set: within(1, 1000, blankRatio => ({ blankRatio })),
  },
  {
    id: 'assumedCvPercent', label: 'Assumed precision', unit: '%', range: 'From 0.1 to 200.',
    sentence: s => `Where a side has one preparation only, every value is taken to scatter by ${threeDigits(s.assumedCvPercent)} %.`,
    source: 'Default 20 %, our assumption: replace it by what your method shows.',
    shown: s => s.assumedCvPercent, set: within(0.1, 200, assumedCvPercent => ({ assumedCvPercent })),
  },
  {
    id: 'intensityLimit', label: 'Intensity limit', unit: 'counts', range: 'Above 0, or empty.',
    sentence: s => s.intensityLimit === null ? 'No feature is set aside for being small.' : `A feature is set aside where no table shows it with at least ${formatIntensity(s.intensityLimit)} counts.`,
    source: 'Default none. Leave it empty for none.',
    shown: s => s.intensityLimit, set: value => value === null ? { intensityLimit: null } : value > 0 && value <= 1e15 ? { intensityLimit: value } : undefined,
  },
]

/** Is this limit as by default? */
export function isDefault(field: SettingField, settings: ComparisonSettings): boolean {
  return settings[field.id] === comparisonDefaults[field.id]
}

/** Are two settings the same in all that the panel changes? */
export function sameSettings(one: ComparisonSettings, other: ComparisonSettings): boolean {
  return JSON.stringify(one) === JSON.stringify(other)
}

/** The draft after a change of it; null where all is as saved again. */
export function changedDraft(saved: ComparisonSettings, draft: ComparisonSettings | null, part: Partial<ComparisonSettings>): ComparisonSettings | null {
  const next = { ...(draft ?? saved), ...part }
  return sameSettings(next, saved) ? null : next
}
