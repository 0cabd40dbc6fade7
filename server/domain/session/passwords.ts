import { TooManyError } from '../DomainError'

/** What the server uses to hash and check; the module's scrypt at run time, a cheap one in tests. */
export interface PasswordHasher {
  hash: (password: string) => Promise<string>
  verify: (hash: string, password: string) => Promise<boolean>
}

/**
 * At most two verifications at once: each takes 128 MB. Passwords are normalised first, so that the same letters
 * typed on another keyboard (é as one sign or as two) are the same password.
 */
export function limitAtOnce(hasher: PasswordHasher, atOnce = 2): PasswordHasher {
  let busy = 0
  const waiting: (() => void)[] = []
  const run = async <T>(work: () => Promise<T>) => {
    if (waiting.length > 50) throw new TooManyError('Too many people are signing in at this moment. Please try again in a few seconds.', 5)
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
    hash: password => run(() => hasher.hash(password.normalize('NFKC'))),
    verify: (hash, password) => run(() => hasher.verify(hash, password.normalize('NFKC'))),
  }
}
