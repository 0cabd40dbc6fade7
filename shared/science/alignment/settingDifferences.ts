import type { AlignmentSettings } from './settings'

const words: { [Name in keyof AlignmentSettings]: (value: AlignmentSettings[Name]) => string } = {
  alignMassPpm: value => `mass tolerance ${value} ppm`,
  massFloorDa: value => value === null ? 'smallest mass tolerance as follows from the ppm' : `smallest mass tolerance ${value} Da`,
  retentionMinutes: value => `time tolerance ${value} min`,
  landmarkWindowMinutes: value => `landmarks within ${value} min`,
  correctOffset: value => `mass offset ${value ? 'taken out' : 'left'}`,
  correctDrift: value => `retention drift ${value ? 'corrected' : 'left'}`,
  referenceDigest: value => value === null ? 'reference: the table with most features' : `reference: the table with digest ${value.slice(0, 8)}`,
}

function differenceOf<Name extends keyof AlignmentSettings>(name: Name, before: AlignmentSettings, now: AlignmentSettings): string[] {
  if (before[name] === now[name]) return []
  const sentence = words[name](now[name])
  return [`${sentence.charAt(0).toUpperCase()}${sentence.slice(1)} (before: ${words[name](before[name])}).`]
}

/** What is set otherwise than before, a sentence each; none where nothing is. */
export function settingDifferences(before: AlignmentSettings, now: AlignmentSettings): string[] {
  return (Object.keys(words) as (keyof AlignmentSettings)[]).flatMap(name => differenceOf(name, before, now))
}
