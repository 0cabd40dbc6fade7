import { monoisotopicMass } from '../../../shared/science/mass/formula'
import { NOTHING, type DemoCompound } from './compounds'
import type { SeededRandom } from './seededRandom'

/** How many invented compounds of each story a study has. */
export interface InventedCounts {
  level: number
  between: number
  moreA: number
  moreB: number
  onlyA: number
  onlyB: number
  solvent: number
  process: number
  /** From the blank in both, and from one side's sample on top. */
  aboveBlankInA: number
}

const MEDIAN_LEVEL = 7_000
const LEVEL_SPREAD = 1.45 // standard deviation of the natural logarithm
const ISOMERS = 0.06

/**
 * Compounds without a name that make up most of a feature table: formulas that could exist, at levels that follow a story.
 * Some are isomers of one another at nearly the same time.
 */
export function inventCompounds(counts: InventedCounts, random: SeededRandom, polarity: 'negative' | 'positive'): DemoCompound[] {
  const invented: DemoCompound[] = []
  const add = (count: number, levels: () => Partial<DemoCompound>) => {
    for (let i = 0; i < count; i++) {
      const twin = random.chance(ISOMERS) ? invented.at(-1) : undefined
      const formula = twin?.formula ?? inventFormula(random)
      const retentionMinutes = twin ? twin.retentionMinutes + random.pick([-1, 1]) * random.between(0.13, 0.45) : inventMinutes(random)
      invented.push({ ...NOTHING, ...levels(), name: `invented ${invented.length + 1}`, formula, retentionMinutes, ions: inventIons(random, polarity) })
    }
  }
  const level = (times = 1) => times * MEDIAN_LEVEL * Math.exp(random.normal(0, LEVEL_SPREAD))
  const strong = () => level(1.6)
  const apart = (low: number, high: number) => 2 ** random.between(low, high)

  add(counts.level, () => {
    const both = level()
    return { levelA: both * 2 ** random.normal(0, 0.16), levelB: both * 2 ** random.normal(0, 0.16) }
  })
  add(counts.between, () => {
    const both = level()
    return { levelA: both * 2 ** random.normal(0, 0.7), levelB: both }
  })
  add(counts.moreA, () => {
    const less = level(0.8)
    return { levelA: less * apart(1.3, 3.4), levelB: less }
  })
  add(counts.moreB, () => {
    const less = level(0.8)
    return { levelA: less, levelB: less * apart(1.3, 3.2) }
  })
  add(counts.onlyA, () => ({ levelA: strong() }))
  add(counts.onlyB, () => ({ levelB: strong() }))
  add(counts.solvent, () => ({ solvent: level() }))
  add(counts.process, () => ({ process: level() }))
  add(counts.aboveBlankInA, () => {
    const process = level(0.6)
    return { process, levelA: process * random.between(9, 25) }
  })
  return invented
}

function inventFormula(random: SeededRandom): string {
  for (;;) {
    const carbon = random.whole(6, 38)
    const oxygen = Math.max(1, Math.round(carbon * random.between(0.12, 0.62)))
    const nitrogen = random.chance(0.22) ? random.whole(1, 3) : 0
    const half = Math.round(carbon * random.between(0.35, 0.92))
    const hydrogen = 2 * half + nitrogen % 2
    const formula = `C${carbon}H${hydrogen}${nitrogen ? `N${nitrogen}` : ''}O${oxygen}`
    const mass = monoisotopicMass(formula)
    if (mass > 110 && mass < 870) return formula
  }
}

/** Most elute in the middle of the gradient. */
const inventMinutes = (random: SeededRandom) => 0.95 + 13.3 * (random.between(0, 1) + random.between(0, 1) + random.between(0, 1)) / 3

function inventIons(random: SeededRandom, polarity: 'negative' | 'positive'): Record<string, number> {
  const others: [string, number, number, number][] = polarity === 'negative'
    ? [['[M+HCOO]- (M+FA-H)', 0.35, 0.05, 0.5], ['[M+Cl]- (35Cl)', 0.15, 0.03, 0.3], ['[M-H2O-H]-', 0.2, 0.05, 0.4], ['[2M-H]-', 0.15, 0.02, 0.25]]
    : [['[M+Na]+', 0.4, 0.05, 0.6], ['[M+NH4]+', 0.15, 0.05, 0.4], ['[M+H-H2O]+', 0.3, 0.05, 0.6], ['[2M+H]+', 0.1, 0.02, 0.2]]
  const ions: Record<string, number> = { [polarity === 'negative' ? '[M-H]-' : '[M+H]+']: 1 }
  for (const [name, probability, low, high] of others) if (random.chance(probability)) ions[name] = random.between(low, high)
  return ions
}
