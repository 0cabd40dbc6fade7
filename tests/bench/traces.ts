/**
 * One mzML file of some hundred megabytes read by the real job: seconds, memory above idle, and how fast an extracted trace comes.
 * `npx tsx --tsconfig .nuxt/tsconfig.server.json tests/bench/traces.ts [scans]`. Seeded; nothing here is timed in CI.
 */
import { closeSync, createReadStream, openSync, readFileSync, statSync, writeSync } from 'node:fs'
import { join } from 'node:path'
import { uploads } from '../../server/db/schema'
import { acceptTrace } from '../../server/domain/trace/acceptTrace'
import { readCentroidsNow } from '../../server/domain/trace/files/readCentroids'
import { listTraces } from '../../server/domain/trace/listTraces'
import { receiveFile, traceLimit } from '../../server/domain/upload/receiveFile'
import { writeMzml } from '../../shared/formats/mzml/writeMzml'
import { extractTrace, traceWindow } from '../../shared/science/traces/extractTrace'
import { addTestPerson, addTestStudy, openTestLaboratory } from '../support/laboratory'
import { processorSeconds } from './measure'
import { seededRandom } from '../support/seededRandom'

const SCANS = Number(process.argv[2] ?? 2700)
const POINTS = 12_000
const MEGABYTE = 2 ** 20
const residentMb = () => Number(/VmRSS:\s+(\d+)/.exec(readFileSync('/proc/self/status', 'utf8'))?.[1]) / 1024

function* scans() {
  const random = seededRandom(5)
  for (let scan = 0; scan < SCANS; scan++) {
    const mz = Float64Array.from({ length: POINTS }, () => 100 + 900 * random.uniform()).sort()
    yield { level: 1, polarity: 'negative' as const, minutes: scan * 0.01, mz, intensity: mz.map(() => Math.exp(4 + 6 * random.uniform())) }
  }
}

async function main() {
  const laboratory = await openTestLaboratory(['trace'])
  try {
    const path = join(laboratory.folder, 'run.mzML')
    const file = openSync(path, 'w')
    for (const piece of writeMzml(SCANS, scans(), { zlib: true, mzBits: 64, intensityBits: 32, grouped: false })) writeSync(file, piece)
    closeSync(file)
    const person = addTestPerson(laboratory, 'analyst')
    const studyId = addTestStudy(laboratory, person).id
    const idle = residentMb()
    let peak = idle
    const watch = setInterval(() => peak = Math.max(peak, residentMb()), 20)
    const start = performance.now()
    const received = await receiveFile(laboratory.folder, createReadStream(path), traceLimit)
    const sent = performance.now()
    const worked = processorSeconds()
    acceptTrace(laboratory, studyId, received, { name: 'run.mzML', intensityLimit: 0 }, person)
    await laboratory.jobs.idle()
    clearInterval(watch)
    const read = performance.now()
    const trace = listTraces(laboratory.db, studyId).traces[0]
    if (!trace) throw new Error(laboratory.db.select().from(uploads).get()?.remark ?? 'no trace')
    console.log(`${(statSync(path).size / MEGABYTE).toFixed(0)} MB, ${trace.scans} scans, ${trace.centroids} points: received in ${((sent - start) / 1000).toFixed(1)} s, read in ${((read - sent) / 1000).toFixed(1)} s (${(processorSeconds() - worked).toFixed(1)} s of processor), kept in ${(trace.keptBytes / MEGABYTE).toFixed(0)} MB`)
    console.log(`memory: ${idle.toFixed(0)} MB idle, at most ${(peak - idle).toFixed(0)} MB above it`)
    const window = traceWindow(455.5, 10)
    const before = performance.now()
    const trace10ppm = extractTrace(readCentroidsNow(laboratory.folder, trace.id, window), window, trace.scans)
    console.log(`one extracted trace of ${trace10ppm.length} scans: ${(performance.now() - before).toFixed(0)} ms`)
  }
  finally {
    laboratory.close()
  }
}

void main()
