import { FetchError } from 'ofetch'

export interface Problem { message: string, issues: { field: string, sentence: string }[] }

/** What a failed request says to the person: its sentence, and the fields it concerns. */
export function toProblem(error: unknown): Problem {
  // useFetch hands on the server's answer in an error of its own.
  if (error instanceof FetchError || field(error, '__nuxt_error') === true) {
    const body = field(error, 'data')
    const message = field(body, 'message')
    const issues = field(field(body, 'data'), 'issues')
    return {
      message: typeof message === 'string' && message ? message : 'The server did not answer. What you typed is still here; please try again.',
      issues: Array.isArray(issues) ? issues.filter(isIssue) : [],
    }
  }
  return { message: 'Something went wrong on this page. Please try again.', issues: [] }
}

function field(value: unknown, name: string): unknown {
  return typeof value === 'object' && value !== null && name in value ? (value as Record<string, unknown>)[name] : undefined
}

function isIssue(value: unknown): value is Problem['issues'][number] {
  return typeof field(value, 'field') === 'string' && typeof field(value, 'sentence') === 'string'
}
