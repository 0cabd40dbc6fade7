import { request } from 'node:http'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'

let server: BuiltServer
beforeAll(async () => {
  server = await startBuiltServer()
})
afterAll(() => server.stop())

/** fetch would set Host and length by itself; attacks need them set by hand. */
function raw(method: string, path: string, headers: Record<string, string>, body?: string): Promise<{ status: number, text: string }> {
  return new Promise((resolve, reject) => {
    const call = request(server.url + path, { method, headers }, (response) => {
      let text = ''
      response.on('data', (chunk: Buffer) => text += chunk)
      response.on('end', () => resolve({ status: response.statusCode ?? 0, text }))
    })
    call.on('error', reject)
    call.end(body)
  })
}
const json = { 'content-type': 'application/json' }
const signIn = JSON.stringify({ signInName: 'nobody', password: 'no password of anyone' })

describe('requests that are turned away', () => {
  it('under a foreign name, as a page that points its own name here would send', async () => {
    expect(await raw('GET', '/api/me', { host: 'elsewhere.example' })).toMatchObject({ status: 421 })
    expect(await raw('GET', '/', { host: 'elsewhere.example:3000' })).toMatchObject({ status: 421 })
  })

  it('changes from another site, by fetch metadata', async () => {
    for (const site of ['cross-site', 'same-site', 'none']) {
      expect((await raw('POST', '/api/sessions', { ...json, 'sec-fetch-site': site, 'origin': server.url }, signIn)).status).toBe(403)
    }
  })

  it('changes from another origin, or from none, where there is no fetch metadata', async () => {
    for (const origin of ['http://elsewhere.example', 'null', 'not an address', `${server.url}0`]) {
      expect((await raw('POST', '/api/sessions', { ...json, origin }, signIn)).status).toBe(403)
    }
    expect((await raw('POST', '/api/sessions', json, signIn)).status).toBe(403)
  })

  it('bodies that do not say their length', async () => {
    const { status } = await raw('POST', '/api/sessions', { ...json, 'origin': server.url, 'transfer-encoding': 'chunked' }, signIn)
    expect(status).toBe(411)
  })

  it('bodies beyond the limit', async () => {
    const { status } = await raw('POST', '/api/sessions', { ...json, 'origin': server.url, 'content-length': '3000000' }, 'x'.repeat(3_000_000))
    expect(status).toBe(413)
  })

  it('bodies beyond the limit, whatever the method', async () => {
    for (const [method, path] of [['PATCH', '/api/me'], ['PUT', '/api/me/password'], ['PATCH', '/api/studies/x/samples'], ['POST', '/api/studies/x/uploads/y']] as const) {
      const { status, text } = await raw(method, path, { ...json, 'origin': server.url, 'content-length': '2000000' }, 'x'.repeat(2_000_000))
      expect(status, path).toBe(413)
      expect(JSON.parse(text)).toMatchObject({ message: expect.stringContaining('smaller parts') as unknown })
    }
  })

  it('the session routes of the module, which know nothing of our rows', async () => {
    expect((await raw('GET', '/api/_auth/session', {})).status).toBe(404)
    expect((await raw('DELETE', '/api/_auth/session', { origin: server.url })).status).toBe(404)
  })

  it('a body that is no JSON, naming the fields', async () => {
    const { status, text } = await raw('POST', '/api/sessions', { ...json, 'origin': server.url, 'content-length': '5' }, '{"a":')
    expect(status).toBe(400)
    expect(JSON.parse(text)).toMatchObject({ data: { issues: [{ field: 'signInName' }, { field: 'password' }] } })
  })
})

describe('every answer', () => {
  it('carries a content policy without inline scripts, and is not stored', async () => {
    const response = await fetch(`${server.url}/sign-in`)
    const policy = response.headers.get('content-security-policy') ?? ''
    expect(policy).toContain('default-src \'none\'')
    expect(policy).toMatch(/script-src 'self' 'strict-dynamic' 'nonce-[^']+'/)
    expect(policy).not.toContain('unsafe-eval')
    expect(policy).not.toMatch(/script-src[^;]*unsafe-inline/)
    expect(response.headers.get('cache-control')).toBe('no-store')
    expect(response.headers.get('referrer-policy')).toBe('no-referrer')
    expect(response.headers.get('x-frame-options')).toBe('DENY')
    expect(response.headers.get('x-request-id')).toMatch(/^[0-9a-f]{8}$/)
    expect(response.headers.has('strict-transport-security')).toBe(false)
  })

  it('says nothing of the server where an address is unknown', async () => {
    const { status, text } = await raw('GET', '/api/no-such-thing', {})
    expect(status).toBe(404)
    expect(text).not.toMatch(/node_modules|\.mjs|\n\s+at /)
  })

  it('names no address outside this machine', async () => {
    const html = await (await fetch(`${server.url}/sign-in`)).text()
    expect(html.match(/(?:src|href)="(?:https?:)?\/\/[^"]*"/g)).toBeNull()
  })
})
