import { frontIons, wholeRunIons } from './background'
import type { DemoIon } from './ions'
import type { SeededRandom } from './seededRandom'

/** How one injection went. */
export interface Injection {
  polarity: 'negative' | 'positive'
  /** Counts of each compound's main ion. */
  contents: Float64Array
  /** How far all its m/z are off. */
  offsetPpm: number
  /** How late a feature of this true retention time came, minutes. */
  driftMinutes: (retentionMinutes: number) => number
}

/** One peak as it left the column: its apex in counts, picked or not. */
export interface DemoSignal { mz: number, minutes: number, intensity: number }

/** A feature table and, for tests, which ion each row is (-1: of no compound). */
export interface SimulatedTable {
  mz: number[]
  retentionMinutes: number[]
  intensity: number[]
  ion: number[]
  /** All that the run held, also what lies below the peak limit or was missed: what its raw data show. */
  signals: DemoSignal[]
}

export const DEMO_RUN_MINUTES = 15
/** Peaks below this are not picked. */
export const DEMO_PEAK_LIMIT = 600
const MASS_SCATTER_PPM = 1.3
const TIME_SCATTER_MINUTES = 0.011
const INJECTION_CV_PERCENT = 5
const MISSED = 0.006
const SPLIT = 0.02

/** One feature table as a peak picker might have written it: scatter, drift, missed and split peaks, bleed, front and noise. */
export function simulateTable(ions: readonly DemoIon[], injection: Injection, random: SeededRandom): SimulatedTable {
  const rows: [mz: number, minutes: number, intensity: number, ion: number][] = []
  const signals: DemoSignal[] = []
  const add = (mz: number, minutes: number, intensity: number, ion: number) => {
    const scatter = random.normal(injection.offsetPpm, MASS_SCATTER_PPM)
    signals.push({ mz: mz * (1 + scatter * 1e-6), minutes: Math.max(0.05, minutes), intensity })
    if (intensity * random.factor(12) < DEMO_PEAK_LIMIT) return
    rows.push([mz * (1 + scatter * 1e-6), Math.max(0.05, minutes), intensity, ion])
  }
  ions.forEach((ion, index) => {
    const counts = (injection.contents[ion.compound] ?? 0) * ion.share * random.factor(INJECTION_CV_PERCENT)
    const minutes = ion.retentionMinutes + injection.driftMinutes(ion.retentionMinutes) + random.normal(0, TIME_SCATTER_MINUTES)
    const missed = random.chance(MISSED)
    const split = random.chance(SPLIT)
    const apart = random.between(0.03, 0.055)
    if (counts > 0 && missed) signals.push({ mz: ion.mz * (1 + injection.offsetPpm * 1e-6), minutes, intensity: counts })
    if (counts > 0 && !missed) add(ion.mz, minutes, counts, index)
    if (counts > 0 && !missed && split) add(ion.mz, minutes + apart, counts * 0.3, -1)
  })
  for (const mz of wholeRunIons[injection.polarity]) {
    for (let i = 0; i < 10; i++) add(mz, random.between(0.4, DEMO_RUN_MINUTES), 1_500 * Math.exp(random.normal(0, 0.4)), -1)
  }
  for (const mz of frontIons[injection.polarity]) add(mz, random.between(0.52, 0.72), 30_000 * Math.exp(random.normal(0, 0.5)), -1)
  for (let i = 0; i < 36; i++) add(Math.exp(random.normal(5.8, 0.5)), random.between(0.5, DEMO_RUN_MINUTES), 1_100 * Math.exp(random.normal(0, 0.5)), -1)
  rows.sort((a, b) => a[0] - b[0] || a[1] - b[1])
  return { mz: rows.map(row => row[0]), retentionMinutes: rows.map(row => row[1]), intensity: rows.map(row => row[2]), ion: rows.map(row => row[3]), signals }
}
