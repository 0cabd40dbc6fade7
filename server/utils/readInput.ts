import type { H3Event } from 'h3'
import type { z } from 'zod'
import { DomainError } from '../domain/DomainError'

/** The body as the schema has it, or an error that names each field. */
export async function readInput<S extends z.ZodType>(event: H3Event, schema: S): Promise<z.output<S>> {
  return check(schema, await readBody(event).catch(() => undefined) ?? {})
}

/** The address's query as the schema has it. Values arrive as text: use z.coerce. */
export function readQueryInput<S extends z.ZodType>(event: H3Event, schema: S): z.output<S> {
  return check(schema, getQuery(event))
}

/** A parameter of the address. */
export function readParam(event: H3Event, name: string): string {
  return getRouterParam(event, name, { decode: true }) ?? ''
}

function check<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  const issues = result.error.issues.map(issue => ({ field: issue.path.join('.'), sentence: issue.message }))
  throw new DomainError('invalid', 'Some of this can\'t be used as it stands.', issues)
}
