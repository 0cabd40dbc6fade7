/** Bytes of a body, whatever the method: the security module looks at POST, PUT and DELETE alone. */
const MOST_BYTES = 2_000_000
const UPLOADS = /^\/api\/studies\/[\w-]+\/(?:traces\/)?uploads$/

/** Every body says its length before it comes (the size limit of each route then holds at once); sign-in's module routes are not ours to use. */
export default defineEventHandler((event) => {
  const path = event.path.split('?')[0] ?? ''
  if (path.startsWith('/api/_auth/')) throw createError({ statusCode: 404, message: 'There is nothing at this address.' })
  const upload = UPLOADS.test(path)
  if (!upload && Number(getRequestHeader(event, 'content-length') ?? 0) >= MOST_BYTES) {
    setResponseHeader(event, 'connection', 'close')
    throw createError({ statusCode: 413, message: 'This is more than is taken at once. Please send it in smaller parts.' })
  }
  const hasBody = getRequestHeader(event, 'transfer-encoding') !== undefined
  if (hasBody && !upload) throw createError({ statusCode: 411, message: 'Please send the length of the body.' })
})
