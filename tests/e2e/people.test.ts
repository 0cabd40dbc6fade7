import { execFile } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { promisify } from 'node:util'
import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { secrets } from '../../server/db/schema'
import { hashSecret } from '../../server/domain/secret/secret'
import { answerOf, ask, cookiesOf, whoIs } from '../support/ask'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { secondConnection } from '../support/secondConnection'

const root = fileURLToPath(new URL('../..', import.meta.url))
const PASSWORD = 'tangle ferry cobalt'
const folder = mkdtempSync(join(tmpdir(), 'steelyard-first-run-'))
let server: BuiltServer
let lead = ''

beforeAll(async () => {
  server = await startBuiltServer({ folder })
})
afterAll(async () => {
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

const codeOf = (output: string) => /\n {4}((?:\w{4}-){5}\w{4})\n/.exec(output)?.[1]
const first = (code: string, signInName = 'ines') => ask(server.url, 'POST', '/api/first', { body: { code, name: 'Ines Vane', signInName, password: PASSWORD } })
const asLead = (method: string, path: string, body?: unknown) => ask(server.url, method, path, { cookie: lead, body })
const secretOf = (link: string) => link.split('/').pop() ?? ''
async function add(signInName: string, roles = ['student']) {
  const response = await asLead('POST', '/api/people', { name: signInName, signInName, roles })
  return await response.json() as { id: string, link: string }
}
const open = (secret: string) => ask(server.url, 'GET', `/api/invitations/${secret}`)
const accept = (secret: string, password = PASSWORD) => ask(server.url, 'POST', `/api/invitations/${secret}`, { body: { password } })

describe('the first run of a real laboratory', () => {
  it('has no account, shows a code on the console, and another at the next start', async () => {
    const former = codeOf(server.output())
    expect(former).toBeDefined()
    expect(await (await ask(server.url, 'GET', '/api/me')).json()).toMatchObject({ first: true, demo: false })
    expect((await ask(server.url, 'GET', '/first')).status).toBe(200)
    await server.kill()
    server = await startBuiltServer({ folder })
    expect(codeOf(server.output())).not.toBe(former)
    expect((await first(former ?? '')).status).toBe(400)
  })

  it('makes the first lab lead with it and signs in; then there is nothing at that address', async () => {
    const code = codeOf(server.output()) ?? ''
    expect((await first('AAAA-BBBB')).status).toBe(400)
    const response = await first(code)
    expect(response.status).toBe(200)
    lead = cookiesOf(response)
    expect(await whoIs(server.url, lead)).toBe('ines')
    expect((await first(code, 'other')).status).toBe(404)
    expect((await ask(server.url, 'GET', '/first')).status).toBe(404)
    expect(await (await ask(server.url, 'GET', '/api/me')).json()).toMatchObject({ first: false })
  })

  it('lists no demo accounts', async () => {
    expect((await ask(server.url, 'GET', '/api/demo-accounts')).status).toBe(404)
  })
})

describe('a one-time link', () => {
  it('begins with the address it was asked under', async () => {
    expect((await add('ben')).link).toMatch(new RegExp(`^${server.url}/invitation/[\\w-]{43}$`))
  })

  it('is looked at without being used up, sets the password, signs in, and is gone', async () => {
    const { link } = await add('cora', ['analyst'])
    const secret = secretOf(link)
    expect(await (await open(secret)).json()).toEqual({ name: 'cora', signInName: 'cora', hasPassword: false })
    expect((await ask(server.url, 'GET', `/invitation/${secret}`)).status).toBe(200)
    expect((await accept(secret, 'coracoracora')).status).toBe(400)
    const response = await accept(secret)
    expect(await whoIs(server.url, cookiesOf(response))).toBe('cora')
    expect((await accept(secret, 'another long phrase')).status).toBe(404)
  })

  it('looks the same when it is wrong, used, ended or withdrawn, as answer and as page', async () => {
    const { id, link: withdrawn } = await add('dora')
    const used = secretOf((await (await asLead('POST', `/api/people/${id}/link`)).json() as { link: string }).link)
    await accept(used)
    const ended = secretOf((await (await asLead('POST', `/api/people/${id}/link`)).json() as { link: string }).link)
    const laboratory = secondConnection(folder)
    laboratory.db.update(secrets).set({ expiresAt: new Date(Date.now() - 1) }).where(eq(secrets.hash, hashSecret(ended))).run()
    laboratory.close()

    const wrong = await answerOf(await open('w'.repeat(43)))
    expect(wrong).toMatchObject({ status: 404 })
    const wrongPost = await answerOf(await accept('w'.repeat(43)))
    const wrongPage = await pageOf('w'.repeat(43))
    expect(wrongPage.status).toBe(404)
    for (const secret of [secretOf(withdrawn), used, ended]) {
      expect(await answerOf(await open(secret))).toEqual(wrong)
      expect(await answerOf(await accept(secret))).toEqual(wrongPost)
      expect(await pageOf(secret)).toEqual(wrongPage)
    }
  })

  it('is never in the server\'s log', async () => {
    const { link } = await add('emil')
    await open(secretOf(link))
    await accept(secretOf(link))
    expect(server.output()).not.toContain(secretOf(link))
  })
})

async function pageOf(secret: string) {
  const response = await ask(server.url, 'GET', `/invitation/${secret}`)
  const text = (await response.text()).replaceAll(secret, '').replaceAll(/nonce="[^"]*"/g, '')
  return { status: response.status, main: /<main[\s\S]*<\/main>/.exec(text)?.[0] }
}

describe('the last lab lead', () => {
  it('can be neither closed nor demoted, by themselves either', async () => {
    const people = await (await asLead('GET', '/api/people')).json() as { id: string, signInName: string }[]
    const id = people.find(person => person.signInName === 'ines')?.id
    expect((await asLead('POST', `/api/people/${id}/close`)).status).toBe(409)
    expect((await asLead('PATCH', `/api/people/${id}`, { name: 'Ines Vane', roles: ['analyst'] })).status).toBe(409)
    expect(await whoIs(server.url, lead)).toBe('ines')
  })
})

describe('npm run recover', () => {
  const recover = async (...names: string[]) => {
    const env = { ...process.env, STEELYARD_DATA: folder, STEELYARD_URL: '', PORT: new URL(server.url).port }
    const result = await promisify(execFile)('npx', ['tsx', '--tsconfig', '.nuxt/tsconfig.server.json', 'scripts/recover.ts', ...names], { cwd: root, env }).catch((error: { stderr: string }) => ({ stdout: '', stderr: error.stderr }))
    return result
  }

  it('lists the lab leads, and makes a link for one while the server runs', async () => {
    expect((await recover()).stdout).toContain('npm run recover -- ines')
    const { stdout } = await recover('Ines')
    const link = /http\S+/.exec(stdout)?.[0] ?? ''
    expect(link.startsWith(server.url)).toBe(true)
    const response = await accept(secretOf(link), 'a new long phrase')
    expect(await whoIs(server.url, cookiesOf(response))).toBe('ines')
    expect(await whoIs(server.url, lead)).toBeNull()
    lead = cookiesOf(response)
  })

  it('makes none for others, and says so', async () => {
    expect((await recover('ben')).stderr).toContain('no open account of a lab lead')
  })

  it('makes a link while the server is stopped', async () => {
    await server.stop()
    const { stdout } = await recover('ines')
    server = await startBuiltServer({ folder })
    expect((await accept(secretOf(/http\S+/.exec(stdout)?.[0] ?? ''), 'one more long phrase')).status).toBe(200)
  })
})
