import { createHash } from 'node:crypto'
import { closeSync, createReadStream, createWriteStream, mkdirSync, openSync, renameSync, rmSync, statSync, writeSync } from 'node:fs'
import { dirname } from 'node:path'
import { pipeline } from 'node:stream/promises'
import { parentPort, workerData } from 'node:worker_threads'
import { createGunzip, createGzip, gzipSync } from 'node:zlib'
import { readTable } from '../../shared/formats/delimitedText/readTable'
import { surveyTable } from '../../shared/formats/delimitedText/surveyTable'
import type { BuiltColumns, SampleFeatures } from '../../shared/science/table/buildColumns'
import type { TableLayout } from '../../shared/science/table/layout'
import { packColumns } from '../../shared/science/table/packColumns'
import { proposeLayout } from '../../shared/science/table/proposeLayout'
import { recallAnswers } from '../../shared/science/table/rememberAnswers'
import type { ProposalBasis, TableProposal } from '../../shared/science/table/tableProposal'
import { TableRefused } from '../../shared/science/table/tableRefused'
import { wholeNumber } from '../../shared/science/numeric/numberWords'
import { packFloat64, packInt32 } from '../db/packed'
import type { ReadColumn, ReadTable, ReadTask, ReadUpload } from '../domain/table/readUpload'

const task = workerData as ReadTask
const PROGRESS_MS = 250
/** Small pieces leave little behind for the collector, so the heap stays small. */
const CHUNK_BYTES = 16_384
const post = (message: unknown) => parentPort?.postMessage(message)

/** The file from its first byte, unpacked where it is an original. */
function open() {
  const stream = createReadStream(task.path, { highWaterMark: CHUNK_BYTES })
  return task.compressed ? stream.pipe(createGunzip()) : stream
}

async function read(): Promise<ReadUpload> {
  const basis = task.basis ?? await look()
  const proposal = proposeLayout(basis.survey, basis.answers, basis.remembered)
  if (proposal.refuse !== null) throw new TableRefused(proposal.refuse)
  const { layout } = proposal
  const settled = layout !== null && (task.decided || proposal.confirmations.length === 0)
  const waiting = async (remark: string | null) => ({ kind: 'waiting' as const, basis, fingerprint: proposal.fingerprint, compressedBytes: await keepOriginal(), remark })
  if (!settled || layout === null) return waiting(null)
  try {
    return await readWith(layout, basis, proposal)
  }
  catch (error) {
    if (error instanceof TableRefused) return waiting(error.message)
    throw error
  }
}

async function look(): Promise<ProposalBasis> {
  post({ progress: 0.05, message: `Looking through ${task.fileName}.` })
  const survey = await surveyTable(open)
  const { fingerprint } = proposeLayout(survey)
  const layout = task.layouts.find(one => one.fingerprint === fingerprint)
  return { survey, answers: layout ? recallAnswers(survey, layout.answers) : {}, remembered: layout !== undefined }
}

async function readWith(layout: TableLayout, basis: ProposalBasis, proposal: TableProposal): Promise<ReadUpload> {
  const { rows } = basis.survey
  let last = 0
  const built = await readTable(open(), layout, rows, (seen) => {
    if (Date.now() - last < PROGRESS_MS) return
    last = Date.now()
    post({ progress: 0.3 + 0.4 * Math.min(1, seen / Math.max(1, rows)), message: `Reading ${task.fileName}: ${wholeNumber(seen)} of ${wholeNumber(rows)} rows.` })
  })
  post({ progress: 0.75, message: `Keeping ${task.fileName}.` })
  const compressedBytes = await keepOriginal()
  const columns = openSync(task.columnsPath, 'w', 0o600)
  try {
    const end = { offset: 0 }
    const tables = built.samples.map(sample => readSample(sample, built, layout, columns, end))
    return { kind: 'read' as const, basis, fingerprint: proposal.fingerprint, layout, compressedBytes, tables, rowsRead: built.rowsRead, skipped: built.skipped, cautions: proposal.cautions }
  }
  finally {
    closeSync(columns)
  }
}

function readSample(sample: SampleFeatures, built: BuiltColumns, layout: TableLayout, file: number, end: { offset: number }): ReadTable {
  const { row, ...features } = sample.take()
  const hash = createHash('sha256')
  for (const part of packColumns(features)) hash.update(part)
  const kept = [['mz', features.mz], ['retentionMinutes', features.minutes], ['intensity', features.intensity], ['width', features.width], ['wideRow', row]] as const
  const columns = kept.flatMap(([name, values]) => values === null ? [] : [writeColumn(file, end, name, values)])
  // A refused cell belongs to its sample, a refused row to every sample of the file.
  const others = new Set(layout.sampleColumns.flatMap(one => one.name === sample.name ? [] : [one.column, one.minutesColumn]).map(column => column === null ? '' : layout.header[column]?.trim()))
  const refused = built.refused.filter(one => sample.name === null || !others.has(one.column))
  return { columns, features: features.mz.length, name: sample.name, emptyShare: sample.emptyShare, digest: hash.digest('hex'), refusedRows: refused.length, refused: refused.length > 0 ? gzipSync(JSON.stringify(refused)) : null }
}

function writeColumn(file: number, end: { offset: number }, name: ReadColumn['name'], values: Float64Array | Int32Array): ReadColumn {
  const bytes = values instanceof Int32Array ? packInt32(values) : packFloat64(values)
  for (let written = 0; written < bytes.length;) written += writeSync(file, bytes, written)
  const column = { name, offset: end.offset, bytes: bytes.length }
  end.offset += bytes.length
  return column
}

/** Compresses the file to its place among the originals: written beside it and renamed, so that the place never holds half a file. */
async function keepOriginal(): Promise<number | null> {
  if (task.compressed) return null
  mkdirSync(dirname(task.originalPath), { recursive: true, mode: 0o700 })
  const part = `${task.originalPath}.${task.uploadId}.part`
  try {
    await pipeline(createReadStream(task.path), createGzip({ level: 4 }), createWriteStream(part, { mode: 0o600, flush: true }))
    renameSync(part, task.originalPath)
  }
  catch (error) {
    rmSync(part, { force: true })
    throw error
  }
  return statSync(task.originalPath).size
}

read().then(
  result => post({ result }),
  (error: unknown) => {
    if (error instanceof TableRefused) post({ refusal: error.message })
    else throw error
  },
)
