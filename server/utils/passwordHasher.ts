import { limitAtOnce, type PasswordHasher } from '../domain/session/passwords'

/** scrypt by nuxt-auth-utils (settings in nuxt.config.ts), at most two at once. */
export const passwordHasher: PasswordHasher = limitAtOnce({ hash: hashPassword, verify: verifyPassword })
