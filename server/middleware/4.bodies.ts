const UPLOADS = /^\/api\/studies\/[\w-]+\/uploads$/

/** Every body says its length before it comes (the size limit of each route then holds at once); sign-in's module routes are not ours to use. */
export default defineEventHandler((event) => {
  const path = event.path.split('?')[0] ?? ''
  if (path.startsWith('/api/_auth/')) throw createError({ statusCode: 404, message: 'There is nothing at this address.' })
  const hasBody = getRequestHeader(event, 'transfer-encoding') !== undefined
  if (hasBody && !UPLOADS.test(path)) throw createError({ statusCode: 411, message: 'Please send the length of the body.' })
})
