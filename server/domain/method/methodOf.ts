import type { Method } from '../../../shared/types/study'
import type { methods } from '../../db/schema'

/** A method as pages show it: what a person wrote, and its id. */
export function methodOf({ id, name, column, gradient, polarity, voidMinutes, divertWindows, remark }: typeof methods.$inferSelect): Method {
  return { id, name, column, gradient, polarity, voidMinutes, divertWindows, remark }
}
