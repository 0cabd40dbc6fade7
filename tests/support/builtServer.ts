import { spawn, type ChildProcess } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

export interface BuiltServer { url: string, folder: string, pid: number, output: () => string, stop: () => Promise<void>, kill: () => Promise<void> }

const entry = fileURLToPath(new URL('../../.output/server/index.mjs', import.meta.url))

/** Starts the built server on a loopback port of its own, with a data folder of its own unless one is given. */
export async function startBuiltServer({ kind = 'lab', folder = '', env = {} }: { kind?: 'demo' | 'lab', folder?: string, env?: Record<string, string> } = {}): Promise<BuiltServer> {
  const data = folder || mkdtempSync(join(tmpdir(), 'steelyard-built-'))
  const port = await freePort()
  let output = ''
  const child = spawn(process.execPath, [entry], {
    env: { MALLOC_ARENA_MAX: '2', MALLOC_MMAP_THRESHOLD_: '1048576', ...process.env, NODE_ENV: 'production', HOST: '127.0.0.1', NITRO_HOST: '127.0.0.1', PORT: String(port), NITRO_PORT: String(port), NITRO_SHUTDOWN_TIMEOUT: '2000', STEELYARD_KIND: kind, STEELYARD_DATA: data, ...env },
  })
  child.stdout.on('data', (chunk: Buffer) => output += chunk)
  child.stderr.on('data', (chunk: Buffer) => output += chunk)
  const url = `http://127.0.0.1:${port}`
  await answering(url, child, () => output)
  const end = (signal: NodeJS.Signals) => new Promise<void>((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) return resolve()
    child.once('exit', () => resolve())
    child.kill(signal)
  })
  return {
    url,
    folder: data,
    pid: child.pid ?? 0,
    output: () => output,
    kill: () => end('SIGKILL'),
    stop: async () => {
      await end('SIGTERM')
      if (!folder) rmSync(data, { recursive: true, force: true })
    },
  }
}

/** Waits for the server's own word that it listens: whatever else answers at the port is not it. */
async function answering(url: string, child: ChildProcess, output: () => string) {
  for (let tries = 0; tries < 1200; tries++) {
    if (child.exitCode !== null) throw new Error(`The server ended at once:\n${output()}`)
    if (/Listening on http/.test(output())) {
      await fetch(`${url}/api/me`)
      return
    }
    await new Promise(resolve => setTimeout(resolve, 100))
  }
  throw new Error(`The server did not answer within two minutes:\n${output()}`)
}

/** A port that nobody uses: tests run side by side on one machine. */
function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer().on('error', reject).listen(0, '127.0.0.1', () => {
      const address = probe.address()
      const port = typeof address === 'object' && address !== null ? address.port : 0
      probe.close(() => resolve(port))
    })
  })
}
