import { randomBytes } from 'node:crypto'

/** A short id for each request: it stands in the log and in the sentence a person sees. */
export default defineEventHandler((event) => {
  event.context.requestId = randomBytes(4).toString('hex')
  setResponseHeader(event, 'x-request-id', event.context.requestId)
})
