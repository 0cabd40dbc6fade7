import type { SampleInput } from '../../../shared/schemas/sample'
import type { DemoCompound } from './compounds'
import { ionsOf } from './ions'
import { seededRandom } from './seededRandom'
import { DEMO_RUN_MINUTES, simulateTable, type DemoSignal, type Injection, type SimulatedTable } from './simulateTable'

export interface SimulatedStudy {
  /** Names the study's random numbers. */
  seed: string
  polarity: 'negative' | 'positive'
  sheet: readonly SampleInput[]
  compounds: readonly DemoCompound[]
  /** Place in the run at which the mass scale was set right. */
  calibratedAt: number
  /** Signals that a side's raw data show and no table of it lists: broad humps that no peak picker takes. `share`: of the other side's level. */
  overlooked?: readonly { compound: string, side: 'A' | 'B', share: number }[]
}

/** volumeMl × dilution / amount / injectionUl of the injection that levels are stated for. */
const PLAIN_FACTOR = 10 * 2 / 1000 / 5
const PLAIN_INJECTION_UL = 5
/** Between preparations of one sample: of everything at once, and of each compound. */
const WORK_UP_CV_PERCENT = 4
const COMPOUND_CV_PERCENT = 9
const BACKGROUND_CV_PERCENT = 8
const DRIFT_PER_INJECTION_MINUTES = 0.016
const MIDDLE_OF_RUN = 8
const BEFORE_CALIBRATION_PPM = -3.4

/** The tables of a study, in the order of its sheet. Each sample has random numbers of its own: a sample more changes no other. */
export function simulateStudy(study: SimulatedStudy): SimulatedTable[] {
  const ions = ionsOf(study.compounds)
  return study.sheet.map(sample => simulateTable(ions, injectionOf(study, sample), seededRandom(`${study.seed} injection ${sample.name}`)))
}

/** What a sample's raw data show and its table does not list. */
export function overlookedSignals(study: SimulatedStudy, sample: SampleInput): DemoSignal[] {
  if (sample.kind !== 'sample') return []
  const { offsetPpm, driftMinutes } = injectionOf(study, sample)
  return (study.overlooked ?? []).filter(one => one.side === sample.side).flatMap(({ compound, share }) => {
    const own = study.compounds.filter(candidate => candidate.name === compound)
    const level = Math.max(...own.map(({ levelA, levelB }) => sample.side === 'B' ? levelA : levelB)) * share * PLAIN_FACTOR / factorOf(sample)
    return ionsOf(own).map(ion => ({ mz: ion.mz * (1 + offsetPpm * 1e-6), minutes: ion.retentionMinutes + driftMinutes(ion.retentionMinutes), intensity: level * ion.share }))
  })
}

function injectionOf(study: SimulatedStudy, sample: SampleInput): Injection {
  const random = seededRandom(`${study.seed} conditions ${sample.name}`)
  const runOrder = sample.runOrder ?? MIDDLE_OF_RUN
  const late = DRIFT_PER_INJECTION_MINUTES * (runOrder - MIDDLE_OF_RUN) + random.normal(0, 0.015)
  const wave = random.normal(0, 0.03)
  const phase = random.between(0, 2 * Math.PI)
  return {
    polarity: study.polarity,
    contents: contentsOf(study, sample),
    offsetPpm: random.normal(runOrder < study.calibratedAt ? BEFORE_CALIBRATION_PPM : 0, 0.2),
    driftMinutes: minutes => late * (0.3 + 0.7 * minutes / DEMO_RUN_MINUTES) + wave * Math.sin(2 * Math.PI * minutes / DEMO_RUN_MINUTES + phase),
  }
}

function contentsOf({ seed, compounds }: SimulatedStudy, sample: SampleInput): Float64Array {
  const ofPreparation = seededRandom(`${seed} preparation ${sample.preparation || sample.name}`)
  const ofInjection = seededRandom(`${seed} background ${sample.name}`)
  const strength = PLAIN_FACTOR / factorOf(sample) * ofPreparation.factor(WORK_UP_CV_PERCENT)
  const injected = (sample.injectionUl ?? PLAIN_INJECTION_UL) / PLAIN_INJECTION_UL
  const workedUp = sample.kind !== 'solventBlank' && sample.kind !== 'standard'
  return Float64Array.from(compounds, (compound) => {
    const own = levelIn(compound, sample) * strength * ofPreparation.factor(COMPOUND_CV_PERCENT)
    const background = (compound.solvent + (workedUp ? compound.process : 0)) * injected * ofInjection.factor(BACKGROUND_CV_PERCENT)
    return own + background
  })
}

function levelIn(compound: DemoCompound, sample: SampleInput): number {
  if (sample.kind === 'standard') return compound.standard
  if (sample.kind === 'pooledQc') return (compound.levelA + compound.levelB) / 2
  if (sample.kind === 'sample') return sample.side === 'B' ? compound.levelB : compound.levelA
  return 0
}

function factorOf({ amount, volumeMl, dilution, injectionUl }: SampleInput): number {
  return amount && volumeMl && dilution && injectionUl ? volumeMl * dilution / amount / injectionUl : PLAIN_FACTOR
}
