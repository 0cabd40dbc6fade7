import { Hash } from '@adonisjs/hash'
import { Scrypt } from '@adonisjs/hash/drivers/scrypt'

export const TEST_PASSWORD = 'a long test password'

/** A hash the server accepts, cheap to make. */
export function testPasswordHash(): Promise<string> {
  return new Hash(new Scrypt({ cost: 2 ** 12 })).make(TEST_PASSWORD)
}

/** Signs in over HTTP and returns the cookie header. */
export async function signInCookie(url: string, signInName: string, password = TEST_PASSWORD): Promise<string> {
  const response = await fetch(`${url}/api/sessions`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: url },
    body: JSON.stringify({ signInName, password }),
  })
  if (!response.ok) throw new Error(`${signInName} could not sign in: ${response.status} ${await response.text()}`)
  return response.headers.getSetCookie().map(cookie => cookie.split(';')[0]).join('; ')
}
