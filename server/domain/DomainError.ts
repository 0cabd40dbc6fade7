export type DomainErrorKind = 'invalid' | 'notSignedIn' | 'forbidden' | 'notFound' | 'conflict' | 'tooLarge' | 'unreadable' | 'tooMany' | 'full'

export interface Issue { field: string, sentence: string }

/** What a domain function throws where it can't do as asked: a sentence for the person, and the fields it concerns. */
export class DomainError extends Error {
  constructor(readonly kind: DomainErrorKind, sentence: string, readonly issues: Issue[] = []) {
    super(sentence)
    this.name = 'DomainError'
  }
}

/** Too much at once or too often: says when to try again, and the answer carries it as Retry-After. */
export class TooManyError extends DomainError {
  constructor(sentence: string, readonly retryAfterSeconds: number) {
    super('tooMany', sentence)
  }
}

/** What may not be seen and what is not there look the same. */
export const notFound = () => new DomainError('notFound', 'There is nothing at this address, or you may not see it.')
