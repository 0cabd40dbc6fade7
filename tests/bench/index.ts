/**
 * `npm run bench`: seeded, prints figures, holds nothing to them. Parts with the server need a build (`npm run build`).
 * `npm run bench -- frames` does one part alone; the parts stand below.
 */
import { existsSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { benchAlignment } from './alignment'
import { benchComponents } from './components'
import { benchFrames } from './frames'
import { benchLaboratory } from './laboratory'
import { secondsOfSort } from './measure'
import { benchTraceMaxima } from './traceMaxima'

const built = existsSync(fileURLToPath(new URL('../../.output/server/index.mjs', import.meta.url)))

const asked = process.argv.slice(2)
const needsBuild = 'Not built yet: run `npm run build` first.'

/** In the order they are run. */
const parts: Record<string, { title: string, bench: () => Promise<void> | void }> = {
  alignment: { title: 'The alignment alone, processor time', bench: () => benchAlignment(yardstick()) },
  components: { title: 'Principal components, from intensities to scores and loadings, by the clock', bench: benchComponents },
  traceMaxima: { title: 'The highest signal of each aligned feature in one trace, processor time', bench: benchTraceMaxima },
  laboratory: { title: 'In the built server, from files to a stored alignment, by the clock', bench: () => built ? benchLaboratory(yardstick()) : console.log(needsBuild) },
  frames: { title: 'The bench in Chromium: JavaScript as sent, and frame times by its tracing', bench: () => built ? benchFrames() : console.log(needsBuild) },
}

let sort = 0
function yardstick(): number {
  if (sort > 0) return sort
  sort = secondsOfSort(1_000_000)
  console.log(`Sorting 1,000,000 doubles in a typed array: ${sort.toFixed(3)} s`)
  return sort
}

async function run() {
  for (const [name, { title, bench }] of Object.entries(parts)) {
    if (asked.length > 0 && !asked.includes(name)) continue
    console.log(`\n${title}`)
    await bench()
  }
}

run().catch((error: unknown) => {
  console.error(error)
  process.exitCode = 1
})
