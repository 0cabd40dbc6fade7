import { foldTimes, threeDigits, times } from '../numeric/numberWords'
import { ReasonFacts, type Judged, type SideNames } from './reasonFacts'
import { REASONS, type Reason } from './reasons'
import type { ComparisonSettings } from './settings'

/** The reason of one feature's verdict as a sentence with its numbers; it says nothing that is not in the stored columns and settings. */
export function reasonSentence(index: number, judged: Judged, settings: ComparisonSettings, names: SideNames): string {
  const reason = REASONS[judged.columns.reason[index] ?? 0] ?? 'inNeither'
  return SENTENCES[reason](new ReasonFacts(index, judged, settings, names))
}

const SENTENCES: Record<Reason, (facts: ReasonFacts) => string> = {
  inNeither: f => `Found in no compared sample of ${f.names.a} or ${f.names.b}; not compared.`,
  divert: f => `Its time, ${f.minutes} min, lies in a window that was sent to waste${f.window}.`,
  intensityLimit: f => `Its highest intensity in any table, ${threeDigits(f.columns.highestCounts[f.i]!)}, does not reach the intensity limit of ${threeDigits(f.settings.intensityLimit ?? 0)}.`,
  blankBorne: f => `Blank-borne: ${f.againstBlank('a')}, ${f.againstBlank('b')}; at least ${times(f.settings.blankRatio)} is asked of one side.`,
  byHand: f => `Set aside by hand: ${f.settings.setAsideByHand.find(({ index }) => index === f.i)?.reason || 'no reason given'}.`,
  foundOnly: f => `Found in ${f.shown.found}, ${f.hiddenPhrase}. It stands ${times(f.columns.reach[f.i]!)} above ${f.hiddenFloor} (at least ${times(f.settings.reachLimit)} is asked), so it would have been seen there. ${f.traceSeen}${f.oneInjection}`,
  neighbour: f => `Found in ${f.shown.found}, ${f.hiddenPhrase}; but the feature beside it${f.neighbourPlace}, within the tolerances, holds ${f.hidden.name}. They may be the same.`,
  gapFilled: f => Number.isNaN(f.columns.atLeast[f.i]!)
    ? `Found in ${f.shown.found}, ${f.hiddenPhrase}; but a table here seems gap-filled and states no floor, so an empty cell does not mean that nothing was there.`
    : `${f.bothFound}; ${f.moreName} holds at least ${times(f.columns.atLeast[f.i]!)}, but a table of the other side seems gap-filled and states no floor, so its empty cells prove nothing.`,
  belowReach: f => Number.isNaN(f.columns.reach[f.i]!)
    ? `Found in ${f.shown.found}, ${f.hiddenPhrase}; but the floor of ${f.hidden.name} is not known, so it can't be said whether it could have shown it.`
    : `Found in ${f.shown.found}, ${f.hiddenPhrase}; but ${f.hidden.name} could not have shown it: it stands only ${times(f.columns.reach[f.i]!)} above ${f.hiddenFloor}, and at least ${times(f.settings.reachLimit)} is asked.`,
  patchyClear: f => `${f.bothFound}. The lowest value of ${f.moreName} is still ${times(f.columns.atLeast[f.i]!)} everything of ${f.lessName}, floors standing for what was not found: at least that much more.`,
  patchy: f => `Patchy: ${f.bothFound}${Number.isNaN(f.columns.atLeast[f.i]!) ? '' : `; the lowest of the one is only ${times(f.columns.atLeast[f.i]!)} the highest of the other, floors included, and at least ${times(Math.max(f.settings.reachLimit, 2 ** f.settings.foldLimit))} is asked`}. Present means at least ${threeDigits(f.settings.presence * 100)} % of a side's preparations.`,
  moreTested: f => `${f.ratio}; ${f.interval}. ${f.q}, at most ${f.settings.alpha} is asked.`,
  moreAssumed: f => `${f.ratio}; ${f.assumed}, at least ${foldTimes(f.assumedLimit)} is called more. ${f.interval}.`,
  levelTested: f => `${f.ratio}; equivalent within ${f.fold} (${f.equivalenceP}, not adjusted). ${f.interval}.`,
  levelSmallDifference: f => `${f.ratio}; equivalent within ${f.fold} (${f.equivalenceP}, not adjusted), and a smaller difference is certain (${f.q}). ${f.interval}.`,
  levelAssumed: f => `${f.ratio}; ${f.assumed}, this is level within ${f.fold}. ${f.interval}.`,
  notCertain: f => `${f.ratio}, but not certain: ${f.q}, at most ${f.settings.alpha} is asked. ${f.interval}.`,
  smallNotLevel: f => `${f.ratio}; neither a difference (${f.q}) nor equivalence within ${f.fold} (${f.equivalenceP}) is shown. ${f.interval}.`,
  smallButCertain: f => `${f.ratio}; a difference is certain (${f.q}), but whether it reaches ${f.fold} is open. ${f.interval}.`,
  assumedBetween: f => `${f.ratio}; ${f.assumed}, at least ${foldTimes(f.assumedLimit)} is called more and ${f.assumedLevelPhrase}. ${f.interval}.`,
  noSpread: f => `${f.ratio}, but there is no spread between replicates: the same data twice?`,
  signalInTrace: f => `Found in ${f.shown.found}, ${f.hiddenPhrase}; but a signal stands in ${f.hiddenTrace} that its table does not list: up to ${times(f.columns.traceRatio[f.i]!)} of ${f.shown.name}'s there, and less than ${times(1 / f.settings.reachLimit)} is asked.`,
  blankOverlap: f => `Found in ${f.shown.found}, ${f.hiddenPhrase}; but ${f.shown.name} holds only ${times(f.shown.level / f.hidden.level)} of what ${f.hidden.name} shows, and at least ${times(f.settings.reachLimit)} is asked.`,
}
