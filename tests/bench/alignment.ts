import { align } from '../../shared/science/alignment/align'
import { alignmentDefaults } from '../../shared/science/alignment/settings'
import { scorePairs } from '../support/pairScore'
import { simulate } from '../support/simulate'
import { processorSeconds, secondsOf } from './measure'

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
  const taken = secondsOf(() => {
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

/** Speed of the alignment alone, on seeded tables, in processor time. Ratios count; seconds depend on the machine. */
export function benchAlignment(sort: number) {
  run('Warm-up', 4, 0)
  const ten = run('10 tables', 10, 0)
  const hundred = run('100 tables', 100, 0)
  const lines = run('100 tables, 20,000 features at one m/z', 100, 200)
  const flood = run('100 tables, 100,000 features at one m/z', 100, 1000)
  console.log(`100 tables take ${(hundred / sort).toFixed(1)} times the sort (at most 40), ${(hundred / ten).toFixed(1)} times 10 tables (at most 15); `
    + `background ions: ${(lines / hundred).toFixed(2)} and ${(flood / hundred).toFixed(2)} times without (at most 2)`)
}
