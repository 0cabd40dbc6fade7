/** A request as this server's own page would make it. */
export function ask(url: string, method: string, path: string, { cookie = '', body, headers = {} }: { cookie?: string, body?: unknown, headers?: Record<string, string> } = {}): Promise<Response> {
  return fetch(url + path, {
    method,
    headers: { origin: url, cookie, ...(body === undefined ? {} : { 'content-type': 'application/json' }), ...headers },
    body: body === undefined ? undefined : JSON.stringify(body),
    redirect: 'manual',
  })
}

/** The cookies an answer sets, as a request sends them back; cleared ones are left out. */
export function cookiesOf(response: Response): string {
  return response.headers.getSetCookie().map(cookie => cookie.split(';')[0] ?? '').filter(cookie => !cookie.endsWith('=')).join('; ')
}

/** Status and body without what names the address asked: two answers that should look the same can be compared. */
export async function answerOf(response: Response): Promise<unknown> {
  const { url, ...body } = await response.json() as Record<string, unknown>
  return { asked: typeof url, status: response.status, body }
}

/** What `GET /api/me` says of a cookie's holder. */
export async function whoIs(url: string, cookie: string): Promise<string | null> {
  const { person } = await (await ask(url, 'GET', '/api/me', { cookie })).json() as { person: { signInName: string } | null }
  return person?.signInName ?? null
}
