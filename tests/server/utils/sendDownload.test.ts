import { createServer, get, type Server } from 'node:http'
import { once } from 'node:events'
import { Readable } from 'node:stream'
import { createApp, eventHandler, toNodeListener } from 'h3'
import { afterEach, expect, it, vi } from 'vitest'
import { sendDownload } from '../../../server/utils/sendDownload'

let server: Server
afterEach(() => server.close())

async function serve(stream: Readable): Promise<string> {
  server = createServer(toNodeListener(createApp().use(eventHandler(event => sendDownload(event, stream))))).listen(0, '127.0.0.1')
  await once(server, 'listening')
  const address = server.address()
  return `http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}`
}

it('a download comes whole', async () => {
  expect(await (await fetch(await serve(Readable.from(['one', 'two'])))).text()).toBe('onetwo')
})

it('a download whose receiver goes away lets go of its source', async () => {
  const released = vi.fn()
  async function* endless() {
    try {
      for (;;) {
        yield 'x'.repeat(65_536)
        await new Promise<void>(resolve => setImmediate(resolve))
      }
    }
    finally {
      released()
    }
  }
  const url = await serve(Readable.from(endless()))
  const call = get(url, response => response.once('data', () => call.destroy()))
  call.on('error', () => {})
  await vi.waitFor(() => expect(released).toHaveBeenCalledOnce(), 30_000)
})
