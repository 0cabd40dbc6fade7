import type { FeatureTable } from '../../shared/science/alignment/types'
import { seededRandom, shuffled, type SeededRandom } from './seededRandom'

export interface Simulation {
  tables: FeatureTable[]
  /** Per table, per row: the true compound; −1 for noise and background. */
  truth: Int32Array[]
}

export const simulationDefaults = {
  tables: 10,
  compounds: 2000,
  /** Noise features per table, as a share of the compounds. */
  noise: 0.15,
  missing: 0.1,
  /** Standard deviation of the mass error, ppm. */
  massPpm: 2,
  /** Standard deviation of the time error, minutes. */
  jitterMinutes: 0.02,
  /** Size of each table's smooth drift, minutes. */
  driftMinutes: 0.25,
  runMinutes: 20,
  /** Share of compounds with an isomer close by. */
  close: 0.05,
  /** Features of each table at one m/z over the whole run. */
  background: 0,
  seed: 1,
}

/**
 * Feature tables whose true correspondence is known, after tests/reference/data/simulate.py: compounds with a mass error, a
 * smooth drift of each table, time jitter and an intensity error; some are missed, and each table has noise of its own.
 */
export function simulate(options: Partial<typeof simulationDefaults> = {}): Simulation {
  const settings = { ...simulationDefaults, ...options }
  const random = seededRandom(settings.seed)
  const compounds = simulateCompounds(settings, random)
  const simulated = Array.from({ length: settings.tables }, (_, position) => simulateTable(position, compounds, settings, random))
  return { tables: simulated.map(one => one.table), truth: simulated.map(one => one.truth) }
}

interface Compound {
  mz: number
  minutes: number
  intensity: number
}

const clampedMz = (logMean: number, spread: number, random: SeededRandom) => Math.min(1200, Math.max(80, Math.exp(logMean + spread * random.normal())))

function simulateCompounds(settings: typeof simulationDefaults, random: SeededRandom): Compound[] {
  const compounds = Array.from({ length: settings.compounds }, () => ({
    mz: clampedMz(Math.log(320), 0.42, random),
    // Early elution is likelier, as in a real run; the mean of two uniforms leans to the middle.
    minutes: 0.5 + (settings.runMinutes - 0.6) * (0.6 * random.uniform() + 0.4 * random.uniform()) ** 1.15,
    intensity: Math.exp(Math.log(2e4) + 1.8 * random.normal()),
  }))
  const close = Math.floor(settings.compounds * settings.close)
  compounds.slice(0, close).forEach((compound, i) => {
    const twin = compounds[i + close] as Compound
    compound.mz = twin.mz
    compound.minutes = Math.max(0.1, twin.minutes + (random.uniform() < 0.5 ? -1 : 1) * (0.12 + 0.28 * random.uniform()))
  })
  return compounds
}

function simulateTable(position: number, compounds: Compound[], settings: typeof simulationDefaults, random: SeededRandom): { table: FeatureTable, truth: Int32Array } {
  const wave = random.normal() * settings.driftMinutes * 0.35
  const slope = random.normal() * settings.driftMinutes * 0.5
  const phase = 2 * Math.PI * random.uniform()
  const run = settings.runMinutes
  const rows: (Compound & { truth: number })[] = []
  compounds.forEach((compound, truth) => {
    if (random.uniform() < settings.missing) return
    const drift = wave * Math.sin(2 * Math.PI * compound.minutes / run + phase) + slope * (compound.minutes / run - 0.3)
    rows.push({
      mz: compound.mz * (1 + random.normal() * settings.massPpm * 1e-6),
      minutes: Math.max(0.05, compound.minutes + drift + random.normal() * settings.jitterMinutes),
      intensity: compound.intensity * Math.exp(random.normal() * 0.15),
      truth,
    })
  })
  for (let n = 0; n < Math.floor(settings.compounds * settings.noise); n++) {
    rows.push({ mz: clampedMz(Math.log(320), 0.5, random), minutes: 0.3 + random.uniform() * (run - 0.3), intensity: Math.exp(Math.log(6e3) + 0.8 * random.normal()), truth: -1 })
  }
  for (let n = 0; n < settings.background; n++) {
    rows.push({ mz: 391.2843 * (1 + random.normal() * settings.massPpm * 1e-6), minutes: random.uniform() * run, intensity: Math.exp(Math.log(5e3) + 0.3 * random.normal()), truth: -1 })
  }
  const mixed = shuffled(rows, random)
  return {
    table: {
      digest: `${(position * 7919 % 1009).toString(16)}-${settings.seed}-${position}`,
      blank: false,
      runOrder: position + 1,
      mz: Float64Array.from(mixed, row => row.mz),
      retentionMinutes: Float64Array.from(mixed, row => row.minutes),
      intensity: Float64Array.from(mixed, row => row.intensity),
    },
    truth: Int32Array.from(mixed, row => row.truth),
  }
}
