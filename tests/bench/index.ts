/** `npm run bench`: seeded, prints figures, holds nothing to them. The part with the server needs a build (`npm run build`). */
import { existsSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { benchAlignment } from './alignment'
import { benchComponents } from './components'
import { benchLaboratory } from './laboratory'
import { secondsOfSort } from './measure'

const built = existsSync(fileURLToPath(new URL('../../.output/server/index.mjs', import.meta.url)))

async function run() {
  const sort = secondsOfSort(1_000_000)
  console.log(`Sorting 1,000,000 doubles in a typed array: ${sort.toFixed(3)} s`)
  console.log('\nThe alignment alone, processor time')
  benchAlignment(sort)
  console.log('\nPrincipal components, from intensities to scores and loadings, by the clock')
  benchComponents()
  console.log('\nIn the built server, from files to a stored alignment, by the clock')
  if (built) await benchLaboratory(sort)
  else console.log('Not built yet: run `npm run build` first.')
}

run().catch((error: unknown) => {
  console.error(error)
  process.exitCode = 1
})
