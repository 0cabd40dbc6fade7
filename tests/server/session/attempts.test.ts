import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { TooManyError } from '../../../server/domain/DomainError'
import { Attempts, ATTEMPTS_AT_ACCOUNT, ATTEMPTS_FROM_ADDRESS, WINDOW_SECONDS } from '../../../server/domain/session/attempts'

let attempts: Attempts
beforeEach(() => {
  vi.useFakeTimers()
  attempts = new Attempts()
})
afterEach(() => vi.useRealTimers())

const stranger = (address = '192.0.2.1') => ({ address, knownBrowser: null })
async function refusal(attempt: Promise<unknown>): Promise<TooManyError | null> {
  try {
    await attempt
    return null
  }
  catch (error) {
    if (error instanceof TooManyError) return error
    throw error
  }
}
async function guess(times: number, account = 'ada', address: (at: number) => string = () => '192.0.2.1') {
  for (let at = 0; at < times; at++) await attempts.atAccount(account, stranger(address(at)))
}

describe('attempts to sign in', () => {
  it('are limited at an account, from however many addresses', async () => {
    await guess(ATTEMPTS_AT_ACCOUNT, 'ada', at => `192.0.2.${at}`)
    expect(await refusal(attempts.atAccount('ada', stranger('198.51.100.9')))).toMatchObject({ kind: 'tooMany', retryAfterSeconds: WINDOW_SECONDS })
    expect(await refusal(attempts.atAccount('ben', stranger('198.51.100.9')))).toBeNull()
  })

  it('are limited from an address, at however many accounts', async () => {
    for (let at = 0; at < ATTEMPTS_FROM_ADDRESS; at++) await attempts.atAccount(`name ${at}`, stranger())
    expect(await refusal(attempts.atAccount('another', stranger()))).not.toBeNull()
    expect(await refusal(attempts.atAccount('another', stranger('198.51.100.9')))).toBeNull()
  })

  it('count the addresses of one IPv6 network together', async () => {
    for (let at = 0; at < ATTEMPTS_FROM_ADDRESS; at++) await attempts.fromAddress(`2001:db8:1:2:${at}::1`)
    expect(await refusal(attempts.fromAddress('2001:db8:1:2:ffff::2'))).not.toBeNull()
    expect(await refusal(attempts.fromAddress('2001:db8:1:3::2'))).toBeNull()
    expect(await refusal(attempts.fromAddress('::ffff:192.0.2.7'))).toBeNull()
  })

  it('are never refused for longer than the window, and asking on does not lengthen it', async () => {
    await guess(ATTEMPTS_AT_ACCOUNT)
    for (let minute = 1; minute < 5; minute++) {
      await vi.advanceTimersByTimeAsync(60_000)
      expect((await refusal(attempts.atAccount('ada', stranger())))?.retryAfterSeconds).toBe(WINDOW_SECONDS - minute * 60)
    }
    await vi.advanceTimersByTimeAsync(60_000)
    expect(await refusal(attempts.atAccount('ada', stranger()))).toBeNull()
  })

  it('say when to try again', async () => {
    await guess(ATTEMPTS_AT_ACCOUNT)
    expect((await refusal(attempts.atAccount('ada', stranger())))?.message).toBe('There were too many attempts. Please try again in 5 minutes.')
    await vi.advanceTimersByTimeAsync(299_000)
    expect((await refusal(attempts.atAccount('ada', stranger())))?.message).toBe('There were too many attempts. Please try again in 1 second.')
  })

  it('from a browser that signed in before are not used up by an attacker elsewhere, nor at its own address', async () => {
    await guess(ATTEMPTS_AT_ACCOUNT)
    for (let at = 0; at < ATTEMPTS_FROM_ADDRESS; at++) await refusal(attempts.atAccount(`name ${at}`, stranger()))
    expect(await refusal(attempts.atAccount('ada', { address: '192.0.2.1', knownBrowser: 'hers' }))).toBeNull()
  })

  it('from a known browser are limited all the same', async () => {
    for (let at = 0; at < ATTEMPTS_AT_ACCOUNT; at++) await attempts.atAccount('ada', { address: '192.0.2.1', knownBrowser: 'hers' })
    expect(await refusal(attempts.atAccount('ada', { address: '192.0.2.1', knownBrowser: 'hers' }))).not.toBeNull()
  })

  it('that were right are given back', async () => {
    for (let at = 0; at < 3 * ATTEMPTS_FROM_ADDRESS; at++) {
      const giveBack = await attempts.atAccount('ada', stranger())
      await giveBack()
    }
    expect(await refusal(attempts.atAccount('ada', stranger()))).toBeNull()
  })

  it('made all at once gain nothing', async () => {
    const refusals = await Promise.all(Array.from({ length: 25 }, () => refusal(attempts.atAccount('ada', stranger()))))
    expect(refusals.filter(each => each === null)).toHaveLength(ATTEMPTS_AT_ACCOUNT)
  })
})
