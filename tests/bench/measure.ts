import { readFileSync } from 'node:fs'
import { seededRandom } from '../support/seededRandom'

/** Seconds of processor time this process has used, collection of memory included: other work beside it does not count. */
export function processorSeconds(): number {
  const { user, system } = process.cpuUsage()
  return (user + system) / 1e6
}

export function secondsOf(work: () => void): number {
  const start = processorSeconds()
  work()
  return processorSeconds() - start
}

/** The yardstick: seconds to sort seeded random doubles in a typed array, the middle of five runs. */
export function secondsOfSort(count: number): number {
  const random = seededRandom(3)
  const values = Float64Array.from({ length: count }, () => random.uniform() * 1000)
  const runs = Array.from({ length: 5 }, () => {
    const copy = values.slice()
    return secondsOf(() => copy.sort())
  })
  return runs.sort((a, b) => a - b)[2] ?? Number.NaN
}

const clockTicks = 100

/** What Linux knows of another process: most memory so far in MB, processor seconds so far. */
export function processFigures(pid: number): { peakMb: number, processorSeconds: number } {
  const peak = /VmHWM:\s+(?<kb>\d+)/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.groups?.kb
  const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1]?.split(' ') ?? []
  return { peakMb: Number(peak ?? Number.NaN) / 1024, processorSeconds: (Number(fields[11]) + Number(fields[12])) / clockTicks }
}

export const shareOf = (values: number[], share: number): number => values.sort((a, b) => a - b)[Math.min(values.length - 1, Math.floor(share * values.length))] ?? Number.NaN
