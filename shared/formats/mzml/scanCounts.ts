import { wholeNumber } from '../../science/numeric/numberWords'

export type ScanPolarity = 'positive' | 'negative'

/** Counts what scans a file holds, so that a refusal can say what is there. */
export class ScanCounts {
  private readonly counts = new Map<string, number>()

  add(level: number | null, polarity: ScanPolarity | null): void {
    const what = level === null ? 'without an MS level' : level === 1 ? (polarity === null ? 'MS1 without a polarity' : `MS1 in ${polarity} mode`) : `MS${level > 9 ? 'n' : level}`
    this.counts.set(what, (this.counts.get(what) ?? 0) + 1)
  }

  /** "300 scans MS1 in positive mode and 30 scans MS2", or "no scans at all". */
  words(): string {
    const parts = [...this.counts].map(([what, count]) => `${wholeNumber(count)} ${count === 1 ? 'scan' : 'scans'} ${what}`)
    return parts.length > 1 ? `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}` : parts[0] ?? 'no scans at all'
  }
}
