import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible'
import { TooManyError } from '../DomainError'

/** Where an attempt comes from: the socket's address, and the id of a browser that has signed in to this account before. */
export interface AttemptSource { address: string, knownBrowser: string | null }

/** Gives an attempt back: a right password counts for nothing. */
export type GiveBack = () => Promise<void>

export const WINDOW_SECONDS = 300
export const ATTEMPTS_AT_ACCOUNT = 10
export const ATTEMPTS_FROM_ADDRESS = 30

/**
 * Limits guessing by account and by address, in memory, in windows of five minutes; nothing is ever locked for longer.
 *
 * The trade-off: a limit by account slows one who guesses from many addresses, but it also lets them keep others out by
 * guessing on. So it holds for unknown browsers only. A browser that has once signed in to the account has a count
 * of its own that nobody else can use up; the right person is let in there whatever happens elsewhere. Under attack only a
 * first sign-in from a new browser may have to wait, at most until the window ends. Behind a proxy all share its address
 * (a header that claims another one is not believed), and the same holds for the limit by address.
 */
export class Attempts {
  private readonly byAddress = new RateLimiterMemory({ points: ATTEMPTS_FROM_ADDRESS, duration: WINDOW_SECONDS })
  private readonly byAccount = new RateLimiterMemory({ points: ATTEMPTS_AT_ACCOUNT, duration: WINDOW_SECONDS })

  /** Counts an attempt before the password is looked at, so that many at once gain nothing. Throws 429 when there were too many. */
  async atAccount(account: string, from: AttemptSource): Promise<GiveBack> {
    if (from.knownBrowser) return spend(this.byAccount, `browser ${from.knownBrowser} ${account}`)
    const giveBackAddress = await this.fromAddress(from.address)
    const giveBackAccount = await spend(this.byAccount, `account ${account}`)
    return async () => {
      await giveBackAddress()
      await giveBackAccount()
    }
  }

  /** Counts an attempt at something that is no account, such as the first code. */
  fromAddress(address: string): Promise<GiveBack> {
    return spend(this.byAddress, network(address))
  }
}

async function spend(limiter: RateLimiterMemory, key: string): Promise<GiveBack> {
  try {
    await limiter.consume(key)
  }
  catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal
    const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000))
    throw new TooManyError(`There were too many attempts. Please try again in ${inWords(seconds)}.`, seconds)
  }
  return async () => {
    await limiter.reward(key)
  }
}

/** Who has one IPv6 address has the 2^64 beside it too. */
function network(address: string): string {
  return address.includes(':') && !address.includes('.') ? address.split(':').slice(0, 4).join(':') : address
}

function inWords(seconds: number): string {
  const minutes = Math.ceil(seconds / 60)
  return seconds < 90 ? `${seconds} ${seconds === 1 ? 'second' : 'seconds'}` : `${minutes} minutes`
}
