import { createReadStream, renameSync, rmSync, writeFileSync } from 'node:fs'
import { parentPort, workerData } from 'node:worker_threads'
import { MzmlRefused } from '../../shared/formats/mzml/mzmlRefused'
import type { MzmlScan } from '../../shared/formats/mzml/mzmlParser'
import { readScans } from '../../shared/formats/mzml/readScans'
import { TraceGatherer } from '../../shared/science/traces/gatherTraces'
import { isPoint } from '../../shared/science/traces/scanSignal'
import { sortCentroids } from '../../shared/science/traces/sortCentroids'
import { packSlice } from '../domain/trace/files/centroidBytes'
import { flushFolder } from '../domain/trace/files/flushFolder'
import { CentroidSpill } from '../domain/trace/files/spillCentroids'
import { traceRemarks } from '../domain/trace/files/traceRemarks'
import { slicePath, traceFolder, unfinishedFolder } from '../domain/trace/files/traceFolder'
import type { ReadTrace, TraceTask } from '../domain/trace/readTrace'

const task = workerData as TraceTask
const PROGRESS_MS = 250
/** Share of the time that reading takes; the rest is sorting and packing. */
const READING_SHARE = 0.8
/** 100 scans a second for an hour and a half. */
const MOST_SCANS = 540_000
const MEGABYTE = 2 ** 20
const post = (message: unknown) => parentPort?.postMessage(message)

const unfinished = unfinishedFolder(task.folder, task.traceId)
let lastProgress = 0

function tell(progress: number, message: string) {
  if (Date.now() - lastProgress < PROGRESS_MS) return
  lastProgress = Date.now()
  post({ progress, message })
}

async function read(): Promise<ReadTrace> {
  // What an ended process left of an earlier try.
  for (const left of [unfinished, traceFolder(task.folder, task.traceId)]) rmSync(left, { recursive: true, force: true })
  const gatherer = new TraceGatherer()
  const spill = new CentroidSpill(unfinished)
  let profileScans = 0
  let seen = 0
  const { withoutTime } = await readScans(createReadStream(task.path, { highWaterMark: 65_536 }), task.polarity, (scan) => {
    if (gatherer.scans === MOST_SCANS) throw new MzmlRefused(`The file has more than ${MOST_SCANS} scans of this kind, more than is taken of one run.`)
    if (scan.profile) profileScans++
    keepPoints(spill, gatherer.add(scan.minutes, scan.mz, scan.intensity), scan)
  }, (bytes) => {
    seen += bytes
    tell(READING_SHARE * Math.min(1, seen / Math.max(1, task.bytes)), `Reading ${task.fileName}: ${Math.floor(seen / MEGABYTE)} of ${Math.ceil(task.bytes / MEGABYTE)} MB.`)
  })
  if (spill.points === 0) throw new MzmlRefused(`The file's ${gatherer.scans} scans in ${task.polarity} mode hold no signal${task.intensityLimit > 0 ? ` of at least ${task.intensityLimit} counts` : ''}, so there is nothing to keep.`)
  const { odd } = gatherer
  const { traces, place } = gatherer.take()
  const kept = writeSlices(spill, place)
  await flushFolder(unfinished)
  renameSync(unfinished, traceFolder(task.folder, task.traceId))
  return { polarity: task.polarity, traces, scans: traces.minutes.length, ...kept, profile: profileScans > 0, remarks: traceRemarks({ withoutTime, odd, profileScans, scans: traces.minutes.length }) }
}

function keepPoints(spill: CentroidSpill, place: number, { mz, intensity }: MzmlScan): void {
  for (let i = 0; i < mz.length; i++) {
    const value = intensity[i]!
    if (value > 0 && value >= task.intensityLimit && isPoint(mz[i]!, value)) spill.add(mz[i]!, value, place)
  }
}

function writeSlices(spill: CentroidSpill, place: Int32Array): Pick<ReadTrace, 'centroids' | 'keptBytes' | 'lowestMz' | 'highestMz'> {
  const slices = spill.all()
  let keptBytes = 0
  let lowestMz = Number.POSITIVE_INFINITY
  let highestMz = 0
  slices.forEach((slice, index) => {
    tell(READING_SHARE + (1 - READING_SHARE) * index / slices.length, `Keeping ${task.fileName}: slice ${index + 1} of ${slices.length}.`)
    const points = sortCentroids(spill.take(slice), place)
    lowestMz = Math.min(lowestMz, points.mz[0]!)
    highestMz = Math.max(highestMz, points.mz.at(-1)!)
    const bytes = packSlice(points)
    writeFileSync(slicePath(unfinished, slice), bytes, { mode: 0o600 })
    keptBytes += bytes.length
  })
  return { centroids: spill.points, keptBytes, lowestMz, highestMz }
}

read().then(
  result => post({ result }),
  (error: unknown) => {
    const full = error instanceof Error && 'code' in error && error.code === 'ENOSPC'
    if (error instanceof MzmlRefused) post({ refusal: error.message })
    else if (full) post({ refusal: 'The server\'s disk is full, so nothing of the file was kept. Ask the lab lead to make room, then send it again.' })
    else throw error
  },
)
