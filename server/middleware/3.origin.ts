const READS = ['GET', 'HEAD', 'OPTIONS']

/** A change may only be asked for by this server's own pages. */
export default defineEventHandler((event) => {
  if (READS.includes(event.method)) return
  const site = getRequestHeader(event, 'sec-fetch-site')
  const origin = getRequestHeader(event, 'origin')
  const own = site ? site === 'same-origin' : !!origin && URL.canParse(origin) && new URL(origin).host === getRequestHeader(event, 'host')
  if (!own) throw createError({ statusCode: 403, message: 'Changes are taken from this server\'s own pages only.' })
})
