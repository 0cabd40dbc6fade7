import { unsealSession, type H3Event } from 'h3'
import { endSession } from '../domain/session/sessions'
import type { StartedSession } from '../domain/session/signIn'
import { newId } from '../db/schema/id'
import { rememberBrowser } from './knownBrowser'

/**
 * The session's secret that the browser's cookie seals, or null. Read without the module's own reader, which writes a
 * fresh cookie for each visitor who has none.
 */
export async function readSessionSecret(event: H3Event): Promise<string | null> {
  const { name, ...config } = cookieConfig(event)
  const sealed = getCookie(event, name)
  if (!sealed) return null
  try {
    const { data } = await unsealSession(event, { name, ...config }, sealed)
    const secure: unknown = data?.secure
    return typeof secure === 'object' && secure !== null && 'sid' in secure && typeof secure.sid === 'string' ? secure.sid : null
  }
  catch {
    // Sealed by nobody here, altered, or too old: a visitor.
    return null
  }
}

/** Signs the browser in: its former session ends, and the cookie names the new one and nothing else. */
export async function beginSession(event: H3Event, { personId, signInName, secret }: StartedSession) {
  const former = await readSessionSecret(event)
  if (former) endSession(useLaboratory().db, former)
  // The module would carry over the former cookie's id, keys and age: begin with an empty one instead.
  event.context.sessions = { ...event.context.sessions, [cookieConfig(event).name]: { id: newId(), createdAt: Date.now(), data: {} } }
  await setUserSession(event, { user: { id: personId }, secure: { sid: secret } })
  rememberBrowser(event, signInName)
  return { id: personId }
}

function cookieConfig(event: H3Event) {
  const { name = 'nuxt-session', maxAge } = useRuntimeConfig(event).session
  return { name, maxAge, password: process.env.NUXT_SESSION_PASSWORD ?? '' }
}
