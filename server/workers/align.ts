import { parentPort, workerData } from 'node:worker_threads'
import { align } from '../../shared/science/alignment/align'
import { alignAsGiven } from '../../shared/science/alignment/alignAsGiven'
import type { AlignedResult, AlignTask } from '../domain/alignment/alignInput'

const { tables, wide, settings } = workerData as AlignTask

const tell = (progress: number, message: string) => parentPort?.postMessage({ progress, message: `${message}.` })
const result = wide.some(part => part !== null) ? alignAsGiven(tables, wide, settings, tell) : align(tables, settings, tell)
const intensity = result.members.map((member, position) => {
  const values = tables[position]?.intensity
  return Float64Array.from(member, row => values?.[row] ?? Number.NaN)
})
const answer: AlignedResult = { result, intensity }
const columns = [result.mz, result.retentionMinutes, result.groupSize, result.neighbourStart, result.neighbourList, ...intensity, ...result.members, ...result.correctedMinutes]
parentPort?.postMessage({ result: answer }, [...new Set(columns.map(column => column.buffer as ArrayBuffer))])
