import type { EventHandlerRequest, H3Event } from 'h3'
import { DomainError, TooManyError, type DomainErrorKind } from '../domain/DomainError'

const statusOf: Record<DomainErrorKind, number> = {
  invalid: 400,
  notSignedIn: 401,
  forbidden: 403,
  notFound: 404,
  conflict: 409,
  tooLarge: 413,
  unreadable: 422,
  tooMany: 429,
  full: 507,
}

/** Every API route: a DomainError becomes its status and sentence; anything unexpected becomes a bare 500, logged with the request's id. */
export function defineRoute<T>(handler: (event: H3Event<EventHandlerRequest>) => Promise<T> | T) {
  return defineEventHandler(async (event) => {
    try {
      return await handler(event)
    }
    catch (error) {
      throw toHttpError(event, error)
    }
  })
}

function toHttpError(event: H3Event, error: unknown) {
  if (error instanceof TooManyError) setResponseHeader(event, 'retry-after', error.retryAfterSeconds)
  if (error instanceof DomainError) {
    return createError({ statusCode: statusOf[error.kind], message: error.message, data: { issues: error.issues } })
  }
  if (isError(error)) return error
  // The route's pattern, not its address: an address may hold a secret.
  console.error(`[${event.context.requestId}] ${event.method} ${event.context.matchedRoute?.path ?? ''}`, error)
  return createError({ statusCode: 500, message: `Something went wrong here. Nothing was changed. (${event.context.requestId})` })
}
