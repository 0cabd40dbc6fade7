import type { Browser, Page } from 'playwright-core'

interface TraceEvent { name: string, ph: string, ts: number, dur?: number, tdur?: number, tid: number, pid: number, args?: { data?: { frame?: string } } }

export interface Frames {
  /** From frame to frame, by the clock. */
  milliseconds: number[]
  /** What the page's own thread computed between them: other work on the machine does not count. */
  busy: number[]
}

/** A frame is asked for at every beat of the screen, so that each pause between two is a frame that came late. */
const ASK_FOR_FRAMES = `(() => {
  window.askingForFrames = true
  const ask = () => { if (window.askingForFrames) requestAnimationFrame(ask) }
  ask()
})()`

const BEGIN = 'act begins'
const END = 'act ends'

/** Milliseconds from frame to frame of the page's own thread while `act` is done, and what it computed, by Chromium's tracing. */
export async function traceFrames(browser: Browser, page: Page, act: () => Promise<void>): Promise<Frames> {
  await page.evaluate(ASK_FOR_FRAMES)
  await page.waitForTimeout(300)
  await browser.startTracing(page, { categories: ['devtools.timeline', 'toplevel', 'blink.user_timing'] })
  await page.waitForTimeout(500)
  // Tracing itself makes the page wait as it begins.
  await page.evaluate(`performance.mark('${BEGIN}')`)
  await act()
  await page.evaluate(`performance.mark('${END}')`)
  const trace = JSON.parse((await browser.stopTracing()).toString('utf8')) as { traceEvents: TraceEvent[] }
  await page.evaluate('window.askingForFrames = false')
  const at = (name: string) => trace.traceEvents.find(event => event.name === name)?.ts ?? Number.NaN
  const [begin, end] = [at(BEGIN), at(END)]
  const beats = trace.traceEvents.filter(event => event.name === 'FireAnimationFrame' && event.ts >= begin && event.ts <= end)
  const [first] = beats
  if (!first) throw new Error('The trace has no frame.')
  const own = beats.filter(event => event.pid === first.pid && event.tid === first.tid).map(event => event.ts).sort((a, b) => a - b)
  // Several callbacks of one frame stand close together.
  const starts = own.filter((ts, at) => at === 0 || ts - (own[at - 1] ?? 0) > 2000)
  const tasks = trace.traceEvents.filter(event => event.name === 'ThreadControllerImpl::RunTask' && event.pid === first.pid && event.tid === first.tid)
  const busy = starts.slice(1).map(() => 0)
  for (const { ts, tdur = 0 } of tasks) {
    const frame = starts.findIndex((start, at) => ts >= start && ts < (starts[at + 1] ?? start))
    if (frame >= 0) busy[frame] = (busy[frame] ?? 0) + tdur / 1000
  }
  return { milliseconds: starts.slice(1).map((ts, at) => (ts - (starts[at] ?? 0)) / 1000), busy }
}
