import { startBuiltServer, type BuiltServer } from './builtServer'
import { signInCookie } from './signIn'

export interface DemoServer extends BuiltServer {
  password: string
  /** The first study of the demo, its alignment and its comparison. */
  studyId: string
  alignmentId: string
  comparisonId: string
  /** Asks the API as a demo person; the body as read, or the status where it is refused. */
  ask: <T>(who: string, path: string, options?: { method?: string, body?: unknown }) => Promise<T>
  statusFor: (who: string, path: string) => Promise<number>
}

interface Line { id: string, counts?: { comparisons: number }, title?: string }
const PATIENCE_MS = 180_000

/** The built server with a demo laboratory of its own, once its studies stand. */
export async function startDemoServer(): Promise<DemoServer> {
  const server = await startBuiltServer({ kind: 'demo' })
  const { password } = await (await fetch(`${server.url}/api/demo-accounts`)).json() as { password: string }
  const cookies = new Map<string, Promise<string>>()
  const cookieOf = (who: string) => {
    const known = cookies.get(who) ?? signInCookie(server.url, who, password)
    cookies.set(who, known)
    return known
  }
  async function send(who: string, path: string, { method = 'GET', body }: { method?: string, body?: unknown } = {}) {
    return fetch(server.url + path, { method, headers: { cookie: await cookieOf(who), origin: server.url, 'content-type': 'application/json' }, body: body === undefined ? undefined : JSON.stringify(body) })
  }
  async function ask<T>(who: string, path: string, options?: { method?: string, body?: unknown }): Promise<T> {
    const response = await send(who, path, options)
    if (!response.ok) throw new Error(`${options?.method ?? 'GET'} ${path}: ${response.status} ${await response.text()}`)
    return await response.json() as T
  }
  const studyId = await readyStudy(ask)
  const [alignment] = (await ask<{ alignments: Line[] }>('analyst', `/api/studies/${studyId}/alignments`)).alignments
  const [comparison] = await ask<Line[]>('analyst', `/api/studies/${studyId}/comparisons`)
  if (!alignment || !comparison) throw new Error('The first demo study has no alignment or no comparison.')
  return {
    ...server, password, studyId, alignmentId: alignment.id, comparisonId: comparison.id, ask,
    statusFor: async (who, path) => (await send(who, path)).status,
  }
}

/** Waits until three demo studies are compared; gives the one on two apple juices. */
async function readyStudy(ask: DemoServer['ask']): Promise<string> {
  for (const start = Date.now(); Date.now() - start < PATIENCE_MS;) {
    const { studies } = await ask<{ studies: Line[] }>('analyst', '/api/studies')
    const first = studies.find(study => study.title?.includes('two apple juices'))
    if (first && studies.length === 3 && studies.every(study => (study.counts?.comparisons ?? 0) > 0)) return first.id
    await new Promise(resolve => setTimeout(resolve, 500))
  }
  throw new Error('The demo laboratory was not ready within three minutes.')
}
