import { Attempts } from '../../server/domain/session/attempts'
import type { PasswordHasher } from '../../server/domain/session/passwords'

/** A hasher that hashes nothing and remembers what it was asked to verify. */
export class NotingHasher implements PasswordHasher {
  readonly verified: { hash: string, password: string }[] = []
  hash(password: string) {
    return Promise.resolve(`hash of ${password}`)
  }

  verify(hash: string, password: string) {
    this.verified.push({ hash, password })
    return Promise.resolve(hash === `hash of ${password}`)
  }
}

/** What signing in takes, fresh for each test. */
export const testMeans = (from: { address?: string, knownBrowser?: string | null } = {}) => ({
  hasher: new NotingHasher(),
  attempts: new Attempts(),
  from: { address: '192.0.2.1', knownBrowser: null, ...from },
})
