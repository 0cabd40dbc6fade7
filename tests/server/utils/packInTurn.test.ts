import { createServer, get, type ClientRequest, type Server } from 'node:http'
import { once } from 'node:events'
import { createApp, createError, eventHandler, toNodeListener } from 'h3'
import { afterEach, expect, it, vi } from 'vitest'
import { packInTurn } from '../../../server/utils/packInTurn'

const PATIENCE_MS = 30_000
/** More than sockets hold by themselves. */
const SIZE = 16 * 2 ** 20

let server: Server
afterEach(() => {
  server.closeAllConnections()
  server.close()
})

async function serve(asker: string, pack: () => Uint8Array): Promise<string> {
  server = createServer(toNodeListener(createApp().use(eventHandler(event => packInTurn(event, asker, pack))))).listen(0, '127.0.0.1')
  await once(server, 'listening')
  const address = server.address()
  return `http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}`
}

it('packed columns come whole, one after the other', async () => {
  const url = await serve('whole', () => new Uint8Array(SIZE).fill(7))
  for (let i = 0; i < 20; i++) expect((await (await fetch(url)).arrayBuffer()).byteLength).toBe(SIZE)
})

it('readers who take nothing hold eight answers in memory, and leave room as they go', async () => {
  const pack = vi.fn(() => new Uint8Array(SIZE))
  const url = await serve('slow', pack)
  const answered = new Set<ClientRequest>()
  for (let i = 0; i < 20; i++) {
    const reader = get(url, (response) => {
      response.pause()
      answered.add(reader)
    })
    reader.on('error', () => {})
  }
  const connections = () => new Promise<number>(resolve => server.getConnections((_, count) => resolve(count)))
  await vi.waitFor(async () => expect([await connections(), answered.size]).toEqual([20, 8]), PATIENCE_MS)
  expect(pack).toHaveBeenCalledTimes(8)
  for (const reader of [...answered]) reader.destroy()
  await vi.waitFor(() => expect(pack).toHaveBeenCalledTimes(16), PATIENCE_MS)
})

it('what fails is told, and the next has its turn', async () => {
  const failing = vi.fn((): Uint8Array => {
    throw createError({ statusCode: 404, message: 'no such version' })
  })
  const url = await serve('failing', failing)
  for (let i = 0; i < 10; i++) expect((await fetch(url)).status).toBe(404)
  expect(failing).toHaveBeenCalledTimes(10)
})
