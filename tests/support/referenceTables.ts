import { createHash } from 'node:crypto'
import { readFileSync, readdirSync } from 'node:fs'
import type { FeatureTable } from '../../shared/science/alignment/types'

export interface ReferenceTables {
  tables: FeatureTable[]
  /** Per table, per row: the true compound, or −1 for noise. */
  truth: Int32Array[]
  mustReach: { pairPrecision: number, pairRecall: number }
}

/** Reads one of tests/reference/data/alignment*: simulated tables with known correspondence (see the README beside them). */
export function readReferenceTables(folder: string): ReferenceTables {
  const path = new URL(`../reference/data/${folder}/`, import.meta.url)
  const known = JSON.parse(readFileSync(new URL('truth.json', path), 'utf8')) as { truth: Record<string, number[]>, mustReach: ReferenceTables['mustReach'] }
  const names = readdirSync(path).filter(name => name.endsWith('.csv')).sort()
  return {
    tables: names.map((name, position) => parseTable(readFileSync(new URL(name, path), 'utf8'), position + 1)),
    truth: names.map(name => Int32Array.from(known.truth[name] ?? [])),
    mustReach: known.mustReach,
  }
}

function parseTable(text: string, runOrder: number): FeatureTable {
  const rows = text.trim().split('\n').slice(1).map(line => line.split(',').map(Number))
  const column = (at: number) => Float64Array.from(rows, row => row[at] ?? Number.NaN)
  return { digest: createHash('sha256').update(text).digest('hex'), blank: false, runOrder, mz: column(0), retentionMinutes: column(1), intensity: column(2) }
}
