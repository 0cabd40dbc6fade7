import { settingWords } from '../../../shared/science/verdict/settingWords'
import type { ComparedSample, ComparisonSettings } from '../../../shared/science/verdict/settings'
import type { UsedTrace } from '../../../shared/types/trace'
import { sampleDifferences } from './sampleDifferences'
import { traceDifferences } from './traceDifferences'

export interface VersionContent {
  alignmentId: string
  alignmentNumber: number
  sideAName: string
  sideBName: string
  settings: ComparisonSettings
  samples: readonly ComparedSample[]
  traces: readonly UsedTrace[]
  engineVersion: string
}

/** What differs between two versions, as sentences; empty where they rest on the same. */
export function versionDifferences(before: VersionContent, after: VersionContent): string[] {
  const words = settingWords(after.settings)
  const settings = settingWords(before.settings).flatMap(([name, value], i) => value === words[i]?.[1] ? [] : [`${name}: ${value} → ${words[i]?.[1]}.`])
  const byHand = (content: VersionContent) => JSON.stringify([...content.settings.setAsideByHand].sort((a, b) => a.index - b.index))
  if (before.settings.setAsideByHand.length === after.settings.setAsideByHand.length && byHand(before) !== byHand(after)) {
    settings.push('Other features, or other reasons, are set aside by hand.')
  }
  return [
    ...(before.alignmentId === after.alignmentId ? [] : [`Alignment ${before.alignmentNumber} → ${after.alignmentNumber}.`]),
    ...(before.sideAName === after.sideAName ? [] : [`Side A is called ${before.sideAName} → ${after.sideAName}.`]),
    ...(before.sideBName === after.sideBName ? [] : [`Side B is called ${before.sideBName} → ${after.sideBName}.`]),
    ...settings,
    ...sampleDifferences(before.samples, after.samples, { handSides: true }),
    ...traceDifferences(before, after),
    ...(before.engineVersion === after.engineVersion ? [] : [`Engine version ${before.engineVersion} → ${after.engineVersion}.`]),
  ]
}
