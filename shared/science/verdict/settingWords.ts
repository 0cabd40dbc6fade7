import { threeDigits, times } from '../numeric/numberWords'
import type { ComparisonSettings } from './settings'

/** The settings of a comparison as name and value, in the order of the methods; for exports and for saying what differs. */
export function settingWords(settings: ComparisonSettings): [name: string, value: string][] {
  const windows = settings.divertWindows.map(({ startMinutes, endMinutes }) => `${threeDigits(startMinutes)} to ${threeDigits(endMinutes)} min`)
  return [
    ['Amount step', settings.normaliseByAmount ? 'on' : 'off'],
    ['Blank ratio', times(settings.blankRatio)],
    ['Sent to waste', windows.length > 0 ? windows.join(', ') : 'nothing'],
    ['Intensity limit', settings.intensityLimit === null ? 'none' : threeDigits(settings.intensityLimit)],
    ['Presence', `${threeDigits(settings.presence * 100)} % of preparations`],
    ['Reach limit', times(settings.reachLimit)],
    ['Fold limit', times(2 ** settings.foldLimit)],
    ['Test', 'Welch t on log2, false discovery rate after Benjamini and Hochberg'],
    ['Alpha', String(settings.alpha)],
    ['Assumed precision without replicates', `${threeDigits(settings.assumedCvPercent)} %`],
    ['Features set aside by hand', settings.setAsideByHand.length === 0 ? 'none' : String(settings.setAsideByHand.length)],
  ]
}
