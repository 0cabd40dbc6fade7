import { TooManyError } from '../DomainError'

const RETRY_SECONDS = 5

interface Waiting { start: () => void }

/**
 * Turns at work that needs much memory: one at a time for each asker, or a few, and few at once in all. Askers take turns with
 * each other, so that whoever asks a hundred times holds up nobody else.
 */
export class Turns {
  private readonly waiting = new Map<string, Waiting[]>()
  private readonly busy = new Map<string, number>()
  private running = 0

  /** @param mostWaiting requests of one asker that may wait; more are refused */
  constructor(private readonly atOnce: number, private readonly mostWaiting: number, private readonly eachAtOnce = 1) {}

  /**
   * Does the work once it is the asker's turn.
   * @param isWanted asked when its turn has come: where nobody waits for it any more, it is not begun
   * @returns null where it was not begun
   * @throws TooManyError where too much of this asker waits already
   */
  async take<T>(asker: string, isWanted: () => boolean, work: () => Promise<T>): Promise<T | null> {
    await this.turn(asker)
    try {
      return isWanted() ? await work() : null
    }
    finally {
      this.count(asker, -1)
      this.behindOthers(asker)
      this.next()
    }
  }

  private turn(asker: string): Promise<void> {
    const own = this.waiting.get(asker) ?? []
    if (own.length >= this.mostWaiting) throw new TooManyError('Too many requests like this one are waiting already. Please try again in a moment.', RETRY_SECONDS)
    return new Promise((start) => {
      this.waiting.set(asker, [...own, { start }])
      this.next()
    })
  }

  private next(): void {
    for (const [asker, [first, ...others]] of this.waiting) {
      if (this.running >= this.atOnce) return
      if (!first || (this.busy.get(asker) ?? 0) >= this.eachAtOnce) continue
      this.count(asker, 1)
      if (others.length > 0) this.waiting.set(asker, others)
      else this.waiting.delete(asker)
      first.start()
    }
  }

  private count(asker: string, by: 1 | -1): void {
    const busy = (this.busy.get(asker) ?? 0) + by
    this.running += by
    if (busy > 0) this.busy.set(asker, busy)
    else this.busy.delete(asker)
  }

  private behindOthers(asker: string): void {
    const own = this.waiting.get(asker)
    this.waiting.delete(asker)
    if (own) this.waiting.set(asker, own)
  }
}
