import type { AlignmentSettings } from '#shared/science/alignment/settings'

/** Settings as they are being typed: a number may be missing. */
export type AlignmentDraft = { [Name in keyof AlignmentSettings]: AlignmentSettings[Name] extends number ? number | null : AlignmentSettings[Name] }

const orGap = (value: number | null) => value === null ? '…' : String(value)

/** What the two tolerances mean, in words. */
export function sameFeatureSentence({ alignMassPpm, retentionMinutes }: Pick<AlignmentDraft, 'alignMassPpm' | 'retentionMinutes'>): string {
  return `Two features are the same if their m/z lie within ${orGap(alignMassPpm)} ppm and their times within ${orGap(retentionMinutes)} min of their common centre.`
}

/** The smallest mass tolerance in Da that a ppm tolerance brings with it: that of m/z 200. */
export function floorSentence({ alignMassPpm, massFloorDa }: Pick<AlignmentDraft, 'alignMassPpm' | 'massFloorDa'>): string {
  if (massFloorDa !== null) return `The mass tolerance is never below ${massFloorDa} Da.`
  return `Below m/z 200 the mass tolerance stays at ${alignMassPpm === null ? '…' : Number((alignMassPpm * 2e-4).toPrecision(3))} Da.`
}

/** Settings in one short line, for lists. */
export function settingsLine(settings: AlignmentSettings): string {
  return [
    `${settings.alignMassPpm} ppm${settings.massFloorDa === null ? '' : `, at least ${settings.massFloorDa} Da`}`,
    `${settings.retentionMinutes} min`,
    settings.correctOffset ? 'offset taken out' : 'offset left',
    settings.correctDrift ? 'drift corrected' : 'drift left',
  ].join(' · ')
}
