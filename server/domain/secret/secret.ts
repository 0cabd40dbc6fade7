import { createHash, randomBytes } from 'node:crypto'

/** 256 bits, safe in an address. */
export const newSecret = () => randomBytes(32).toString('base64url')
/** What is kept of a secret. */
export const hashSecret = (secret: string) => createHash('sha256').update(secret).digest('hex')
