import { createHmac, timingSafeEqual } from 'node:crypto'
import type { H3Event } from 'h3'
import { newId } from '../db/schema/id'
import type { AttemptSource } from '../domain/session/attempts'

const REMEMBERED_SECONDS = 180 * 86_400

/**
 * Remembers in a cookie of its own that this browser has signed in to the account once. It opens nothing: it only gives
 * the browser a count of attempts that nobody else can use up (see domain/session/attempts).
 */
export function rememberBrowser(event: H3Event, signInName: string) {
  const id = readKnownBrowser(event, signInName) ?? newId()
  const { cookie } = useRuntimeConfig(event).session
  const secure = cookie ? cookie.secure ?? true : true
  setCookie(event, cookieName(signInName), `${id}.${sign(signInName, id)}`, { path: '/', httpOnly: true, sameSite: 'lax', secure, maxAge: REMEMBERED_SECONDS })
}

/** Where an attempt at an account comes from. The address is the socket's: a header can claim anything. */
export function attemptSource(event: H3Event, signInName: string): AttemptSource {
  return { address: socketAddress(event), knownBrowser: readKnownBrowser(event, signInName) }
}

export function socketAddress(event: H3Event): string {
  return event.node.req.socket.remoteAddress ?? ''
}

function readKnownBrowser(event: H3Event, signInName: string): string | null {
  const [id = '', signature = ''] = (getCookie(event, cookieName(signInName)) ?? '').split('.')
  const right = Buffer.from(sign(signInName, id))
  const given = Buffer.from(signature)
  return id && right.length === given.length && timingSafeEqual(right, given) ? id : null
}

/** A cookie an account, since a laboratory's computer has several users; the name does not show whose. */
const cookieName = (signInName: string) => `steelyard-known-${sign('cookie name', signInName).slice(0, 12)}`

function sign(subject: string, id: string): string {
  return createHmac('sha256', process.env.NUXT_SESSION_PASSWORD ?? '').update(`known browser\n${subject}\n${id}`).digest('base64url')
}
