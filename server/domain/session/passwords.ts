import { DomainError } from '../DomainError'

/** What the server uses to hash and check; the module's scrypt at run time, a cheap one in tests. */
export interface PasswordHasher {
  hash: (password: string) => Promise<string>
  verify: (hash: string, password: string) => Promise<boolean>
}

/** At most two verifications at once: each takes 128 MB. */
export function limitAtOnce(hasher: PasswordHasher, atOnce = 2): PasswordHasher {
  let busy = 0
  const waiting: (() => void)[] = []
  const run = async <T>(work: () => Promise<T>) => {
    if (waiting.length > 50) throw new DomainError('tooMany', 'Too many people are signing in at this moment. Please try again.')
    if (busy >= atOnce) await new Promise<void>(resolve => waiting.push(resolve))
    busy++
    try {
      return await work()
    }
    finally {
      busy--
      waiting.shift()?.()
    }
  }
  return {
    hash: password => run(() => hasher.hash(password)),
    verify: (hash, password) => run(() => hasher.verify(hash, password)),
  }
}
