import { newId } from './id'
import { integer, text } from 'drizzle-orm/sqlite-core'

/** A random id of 22 characters: 128 bits, so ids can neither be guessed nor counted. */
export const id = () => text().primaryKey().$defaultFn(newId)
/** A moment in UTC, kept as milliseconds. */
export const moment = () => integer({ mode: 'timestamp_ms' })
export const createdAt = () => moment().notNull().$defaultFn(() => new Date())
