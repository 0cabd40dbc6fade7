import { TooManyError } from '../DomainError'

const RETRY_SECONDS = 5

interface Waiting { start: () => void }

/**
 * Turns at work that needs much memory: one at a time for each asker and few at once in all. Askers take turns with each other,
 * so that whoever asks a hundred times holds up nobody else.
 */
export class Turns {
  private readonly waiting = new Map<string, Waiting[]>()
  private readonly busy = new Set<string>()

  /** @param mostWaiting requests of one asker that may wait; more are refused */
  constructor(private readonly atOnce: number, private readonly mostWaiting: number) {}

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
      this.busy.delete(asker)
      this.behindOthers(asker)
      this.next()
    }
  }

  private turn(asker: string): Promise<void> {
    const own = this.waiting.get(asker) ?? []
    if (own.length >= this.mostWaiting) throw new TooManyError('Too many requests for raw data are waiting already. Please try again in a moment.', RETRY_SECONDS)
    return new Promise((start) => {
      this.waiting.set(asker, [...own, { start }])
      this.next()
    })
  }

  private next(): void {
    for (const [asker, [first, ...others]] of this.waiting) {
      if (this.busy.size >= this.atOnce) return
      if (!first || this.busy.has(asker)) continue
      this.busy.add(asker)
      if (others.length > 0) this.waiting.set(asker, others)
      else this.waiting.delete(asker)
      first.start()
    }
  }

  private behindOthers(asker: string): void {
    const own = this.waiting.get(asker)
    this.waiting.delete(asker)
    if (own) this.waiting.set(asker, own)
  }
}
