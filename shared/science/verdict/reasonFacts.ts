import { assumedMoreLimit, assumedStandardError, ONE_SIDED_95 } from '../statistics/assumedPrecision'
import { counted, foldTimes, namedProbability, signed, threeDigits, times } from '../numeric/numberWords'
import type { ComparisonSettings } from './settings'
import type { VerdictResult } from './verdictResult'

/** What the two sides are called. */
export interface SideNames { a: string, b: string }

/** What a sentence is told from: the stored columns and the number of preparations. */
export type Judged = Pick<VerdictResult, 'columns' | 'preparationsA' | 'preparationsB' | 'samplesA' | 'samplesB'>

/** Phrases about one feature, made when a sentence asks for them. */
export class ReasonFacts {
  readonly columns: VerdictResult['columns']
  constructor(readonly i: number, private readonly judged: Judged, readonly settings: ComparisonSettings, readonly names: SideNames) {
    this.columns = judged.columns
  }

  private side(side: 'a' | 'b') {
    const detected = (side === 'a' ? this.columns.detectedA : this.columns.detectedB)[this.i]!
    const preparations = side === 'a' ? this.judged.preparationsA : this.judged.preparationsB
    const injections = (side === 'a' ? this.columns.injectionsA : this.columns.injectionsB)[this.i]!
    const level = (side === 'a' ? this.columns.levelA : this.columns.levelB)[this.i]!
    return { name: this.names[side], detected, injections, level, found: `${detected} of ${counted(preparations, 'preparation')} of ${this.names[side]}` }
  }

  /** The side that counts as not found, where one does. */
  private get hiddenSide(): 'a' | 'b' {
    const blank = this.columns.notAboveBlank[this.i]
    if (blank === 1) return 'a'
    if (blank === 2) return 'b'
    return this.columns.detectedA[this.i] === 0 ? 'a' : 'b'
  }

  get shown() { return this.side(this.hiddenSide === 'a' ? 'b' : 'a') }
  get hidden() { return this.side(this.hiddenSide) }
  private get hiddenIsBlank() { return this.columns.notAboveBlank[this.i]! > 0 }
  get hiddenPhrase() {
    return this.hiddenIsBlank ? `and in ${this.hidden.name} not above the blank (${this.againstBlank(this.hiddenSide)}, ${times(this.settings.blankRatio)} is asked), which counts as not found` : `in none of ${this.hidden.name}`
  }

  get hiddenFloor() { return this.hiddenIsBlank ? `the blank's level in ${this.hidden.name}` : `the highest floor of ${this.hidden.name}` }
  get oneInjection() { return this.shown.injections === 1 ? ' It rests on one injection.' : '' }
  /** "Tallow Lane's trace (3 of 3 samples)": the traces of the side that counts as not found. */
  get hiddenTrace() {
    const samples = this.hiddenSide === 'a' ? this.judged.samplesA : this.judged.samplesB
    return `${this.hidden.name}'s trace (${this.columns.traceSamples[this.i]!} of ${counted(samples, 'sample')})`
  }

  /** What the trace of the side that does not list it says; ends an absence that holds. */
  get traceSeen() {
    if (this.hiddenIsBlank) return 'No trace was asked: the signal there is listed, and was judged against the blank.'
    if (this.columns.traceSamples[this.i] === 0) return 'No trace to check.'
    const ratio = this.columns.traceRatio[this.i]!
    if (Number.isNaN(ratio)) return `${this.hiddenTrace} can't be checked: there is no trace of ${this.shown.name} with a signal there to measure by, and its tables do not give heights.`
    return `Trace seen: ${this.hiddenTrace} shows ${ratio > 0 ? `at most ${times(ratio)} of ${this.shown.name}'s` : 'nothing'} there.`
  }

  get minutes() { return this.columns.retentionMinutes[this.i]!.toFixed(2) }
  get window() {
    const minutes = this.columns.retentionMinutes[this.i]!
    const window = this.settings.divertWindows.find(({ startMinutes, endMinutes }) => minutes >= startMinutes && minutes <= endMinutes)
    return window ? ` (${threeDigits(window.startMinutes)} to ${threeDigits(window.endMinutes)} min)` : ''
  }

  againstBlank(side: 'a' | 'b') {
    const { name, detected } = this.side(side)
    const ratio = (side === 'a' ? this.columns.blankRatioA : this.columns.blankRatioB)[this.i]!
    return detected === 0 ? `${name} does not show it` : `${name} is ${times(ratio)} the blank`
  }

  get neighbourPlace() {
    const at = this.columns.neighbour[this.i]!
    return at < 0 ? '' : ` (m/z ${this.columns.mz[at]!.toFixed(4)}, ${this.columns.retentionMinutes[at]!.toFixed(2)} min)`
  }

  get bothFound() { return `Found in ${this.side('a').found} and in ${this.side('b').found}` }
  /** The side that is more, in patchy cases: the one found in the larger share. */
  private get moreSide(): 'a' | 'b' {
    const a = this.columns.detectedA[this.i]! / this.judged.preparationsA
    return a >= this.columns.detectedB[this.i]! / this.judged.preparationsB ? 'a' : 'b'
  }

  get moreName() { return this.names[this.moreSide] }
  get lessName() { return this.names[this.moreSide === 'a' ? 'b' : 'a'] }
  get fold() { return times(2 ** this.settings.foldLimit) }
  get q() { return namedProbability('q', this.columns.q[this.i]!) }
  get equivalenceP() { return namedProbability('p', this.columns.equivalenceP[this.i]!) }

  get ratio() {
    const log2Ratio = this.columns.log2Ratio[this.i]!
    const [more, less] = log2Ratio < 0 ? [this.names.a, this.names.b] : [this.names.b, this.names.a]
    const size = 2 ** Math.abs(log2Ratio)
    const words = threeDigits(size) === '1' ? `${this.names.a} and ${this.names.b} are equal` : `${more} holds ${times(size)} of ${less}`
    return `${words} (log2 B/A ${signed(log2Ratio, 2)})`
  }

  get interval() {
    return `95 % interval of log2 B/A ${signed(this.columns.low[this.i]!, 2)} to ${signed(this.columns.high[this.i]!, 2)}`
  }

  private get standardError() {
    return assumedStandardError(this.settings.assumedCvPercent, this.columns.detectedA[this.i]!, this.columns.detectedB[this.i]!)
  }

  get assumed() {
    return `at an assumed precision of ${threeDigits(this.settings.assumedCvPercent)} %, ${this.columns.detectedA[this.i]} against ${counted(this.columns.detectedB[this.i]!, 'preparation')}`
  }

  get assumedLimit() { return assumedMoreLimit(this.settings.foldLimit, this.standardError) }
  get assumedLevelPhrase() {
    const limit = this.settings.foldLimit - ONE_SIDED_95 * this.standardError
    return limit > 0 ? `below ${foldTimes(limit)} level` : 'nothing can be called level'
  }
}
