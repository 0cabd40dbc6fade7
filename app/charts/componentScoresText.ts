import { FEWEST_FOR_ELLIPSE } from '#shared/science/components/groupEllipse'
import type { SampleComponents } from '#shared/science/components/sampleComponents'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { counted, signed } from '#shared/science/numeric/numberWords'
import { componentName } from '~/charts/componentAxis'
import type { ScoreGroup } from '~/charts/componentScores'
import { groupLabels } from '~/charts/sampleValues'

/** The plot of scores in words: its axes, where each group lies, which have an ellipse. */
export function scoresText(found: SampleComponents, groups: readonly ScoreGroup[], across: number, upwards: number, names: SideNames): string {
  const isPlane = upwards <= found.rank
  const where = groups.map(({ group, samples }) => {
    const ranges = [`PC${across} ${range(samples.map(({ x }) => x))}`, ...(isPlane ? [`PC${upwards} ${range(samples.map(({ y }) => y))}`] : [])]
    return `${groupLabels(names)[group]}, ${counted(samples.length, 'sample')}: ${ranges.join(', ')}`
  })
  return [
    `Across ${componentName(found, across)}; upwards ${componentName(found, upwards)}.`,
    `${where.join('; ')}.`,
    ellipseSentence(groups, names),
  ].join(' ')
}

function range(values: readonly number[]): string {
  const [low, high] = [Math.min(...values), Math.max(...values)]
  return short(low) === short(high) ? short(low) : `${short(low)} to ${short(high)}`
}

const short = (value: number) => signed(value, Math.abs(value) >= 10 ? 0 : 1)

/** Which groups have an ellipse and which are too small for one. */
export function ellipseSentence(groups: readonly ScoreGroup[], names: SideNames): string {
  const withOne = groups.filter(({ ellipse }) => ellipse !== null)
  const without = groups.filter(({ ellipse }) => ellipse === null)
  const list = (some: readonly ScoreGroup[]) => some.map(({ group, samples }) => `${groupLabels(names)[group]} (${samples.length})`).join(', ')
  const least = `fewer than ${FEWEST_FOR_ELLIPSE} samples`
  if (withOne.length === 0) return `No ellipses: each group has ${least}.`
  const drawn = `Ellipses hold 95 % of samples like those of ${list(withOne)}.`
  return without.length === 0 ? drawn : `${drawn} None for ${list(without)}: ${least}.`
}
