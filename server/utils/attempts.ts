import { Attempts } from '../domain/session/attempts'

/** One count for the whole server, in memory. */
export const attempts = new Attempts()
