import type { DemoCompound } from './compounds'
import type { SeededRandom } from './seededRandom'

const SEASON_CV_PERCENT = 14
const BATCH_CV_PERCENT = 18

/** The same juices after two months: fruit changes a little, the carton's batch a little more, and no mould this time. */
export function laterBatch(compounds: readonly DemoCompound[], random: SeededRandom): DemoCompound[] {
  return compounds.map(compound => ({
    ...compound,
    levelA: compound.name === 'patulin' ? 0 : compound.levelA * random.factor(SEASON_CV_PERCENT),
    levelB: compound.levelB * random.factor(BATCH_CV_PERCENT),
  }))
}
