/**
 * Speed of the alignment alone, on seeded tables: `npx tsx tests/bench/alignment.ts`. Ratios count; seconds depend on the
 * machine. Times are those of the processor, collection of memory included, so that other work beside it does not count.
 */
import { align } from '../../shared/science/alignment/align'
import { alignmentDefaults } from '../../shared/science/alignment/settings'
import { scorePairs } from '../support/pairScore'
import { seededRandom } from '../support/seededRandom'
import { simulate } from '../support/simulate'

const processorSeconds = (): number => {
  const { user, system } = process.cpuUsage()
  return (user + system) / 1e6
}

const seconds = (work: () => void): number => {
  const start = processorSeconds()
  work()
  return processorSeconds() - start
}

function timeOfSort(count: number): number {
  const random = seededRandom(3)
  const values = Float64Array.from({ length: count }, () => random.uniform() * 1000)
  const runs = Array.from({ length: 5 }, () => {
    const copy = values.slice()
    return seconds(() => copy.sort())
  })
  return runs.sort((a, b) => a - b)[2] ?? Number.NaN
}

function run(name: string, tables: number, background: number): number {
  const simulation = simulate({ tables, compounds: 9524, background, seed: 11 })
  const features = simulation.tables.reduce((sum, table) => sum + table.mz.length, 0)
  let peak = 0
  const stages = new Map<string, number>()
  let last = processorSeconds()
  let stage = 'Starting'
  const note = (_: number, name: string) => {
    const now = processorSeconds()
    stages.set(stage, (stages.get(stage) ?? 0) + now - last)
    last = now
    stage = name
    peak = Math.max(peak, process.memoryUsage().rss)
  }
  let result = null as ReturnType<typeof align> | null
  const taken = seconds(() => {
    result = align(simulation.tables, alignmentDefaults, note)
  })
  note(1, 'End')
  if (!result) throw new Error('The alignment gave nothing.')
  const { pairPrecision, pairRecall } = scorePairs(result.members, simulation.truth)
  console.log(`${name}: ${features} features, ${taken.toFixed(2)} s, ${Math.round(features / taken)} features/s, ${result.mz.length} groups, `
    + `${result.crowdedPieces} crowded pieces, precision ${pairPrecision.toFixed(4)}, recall ${pairRecall.toFixed(4)}, memory ${Math.round(peak / 2 ** 20)} MB`)
  console.log(`   ${[...stages].map(([name, spent]) => `${name} ${spent.toFixed(2)} s`).join(' · ')}`)
  return taken
}

run('Warm-up', 4, 0)
const sort = timeOfSort(1_000_000)
console.log(`Sorting 1,000,000 doubles in a typed array: ${sort.toFixed(3)} s`)
const ten = run('10 tables', 10, 0)
const hundred = run('100 tables', 100, 0)
const lines = run('100 tables, 20,000 features at one m/z', 100, 200)
const flood = run('100 tables, 100,000 features at one m/z', 100, 1000)
console.log(`100 tables take ${(hundred / sort).toFixed(1)} times the sort (at most 40), ${(hundred / ten).toFixed(1)} times 10 tables (at most 15); `
  + `background ions: ${(lines / hundred).toFixed(2)} and ${(flood / hundred).toFixed(2)} times without (at most 2)`)
