import { ownHosts } from '../utils/environment'

/** Answers only under this server's own names (a page elsewhere can't point its own name here). */
export default defineEventHandler((event) => {
  const host = getRequestHeader(event, 'host') ?? ''
  const name = host.replace(/:\d+$/, '').toLowerCase()
  if (!ownHosts().includes(name)) throw createError({ statusCode: 421, message: 'This server is not known by that name. Set STEELYARD_URL to the address people use.' })
})
