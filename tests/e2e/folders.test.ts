import { afterEach, describe, expect, it } from 'vitest'
import { demoAccounts } from '../../server/domain/demo/accounts'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { signInCookie } from '../support/signIn'

const servers: BuiltServer[] = []
const start = async (options: Parameters<typeof startBuiltServer>[0]) => {
  const server = await startBuiltServer(options)
  servers.push(server)
  return server
}
afterEach(async () => {
  for (const server of servers.splice(0).reverse()) await server.stop()
})

describe('a data folder', () => {
  it('of a demo laboratory is never opened as a real one; its accounts are listed in the demo alone', async () => {
    const demo = await start({ kind: 'demo' })
    const { password, accounts } = await (await fetch(`${demo.url}/api/demo-accounts`)).json() as { password: string, accounts: { signInName: string }[] }
    expect(accounts).toHaveLength(demoAccounts.length)
    for (const { signInName } of accounts) await signInCookie(demo.url, signInName, password)
    expect(demo.output()).toContain(`sign in as ${demoAccounts.map(account => account.signInName).join(', ')} with the password: ${password}`)
    await demo.kill()
    await expect(startBuiltServer({ kind: 'lab', folder: demo.folder })).rejects.toThrow('holds a demo laboratory; it cannot be opened as a real one')
  })

  it('is served by one process', async () => {
    const { folder } = await start({})
    await expect(startBuiltServer({ folder })).rejects.toThrow('Another Steelyard already runs on')
  })
})

describe('the address', () => {
  it('must be set where the server listens for others, and is used for links', async () => {
    const open = await start({ env: { STEELYARD_HOST: '0.0.0.0' } })
    expect(open.output()).toContain('Set STEELYARD_URL to the address people type')
    const named = await start({ env: { STEELYARD_HOST: '0.0.0.0', STEELYARD_URL: 'https://steelyard.example' } })
    expect(named.output()).not.toContain('Set STEELYARD_URL')
    expect(named.output()).toContain('https://steelyard.example/first')
  })

  it('that is none stops the start with a sentence', async () => {
    await expect(startBuiltServer({ env: { STEELYARD_URL: 'lab-server:3000' } })).rejects.toThrow('STEELYARD_URL is "lab-server:3000"')
  })
})
