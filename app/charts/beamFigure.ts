import type { Verdict } from '#shared/science/verdict/verdicts'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { beamEnds, beamLean } from '~/charts/beam'
import { fitText, round, type Drawing, type DrawnShape } from '~/charts/drawing'
import { formatCount } from '~/utils/formatMeasures'

const ARM = 250
const WEIGHT = 2.5

/** The beam with what hangs on it, for paper: as on the page, with the counts of each side under its pan. */
export function beamFigure(counts: Record<Verdict, number>, names: SideNames, width: number): Drawing {
  const middle = width / 2
  const { degrees, text } = beamLean(counts, names)
  const { left, right } = beamEnds(degrees, [middle, 34], ARM)
  const [ax, ay, bx, by] = [...left, ...right].map(round) as [number, number, number, number]
  const label = (x: number, y: number, words: string, ink: 'sideA' | 'sideB' | 'muted', strong = false): DrawnShape => ({ kind: 'text', x, y, text: fitText(words, 420, strong ? 15 : 12), ink, anchor: 'middle', size: strong ? 15 : 12, strong })
  const middles: [words: string, count: number][] = [['level', counts.level], ['unsettled', counts.unsettled], ['set aside', counts.setAside]]
  return {
    width, height: 176,
    shapes: [
      { kind: 'line', d: `M${ax} ${ay}L${bx} ${by}`, ink: 'ink', weight: WEIGHT },
      { kind: 'line', d: `M${middle} 34l-14 32h28z`, ink: 'ink', filled: true },
      { kind: 'line', d: `M${middle - 30} 67h60`, ink: 'ink', weight: WEIGHT },
      { kind: 'line', d: `M${ax} ${ay}v14m-18 0a18 18 0 0 0 36 0z`, ink: 'sideA', weight: WEIGHT },
      { kind: 'line', d: `M${bx} ${by}v14m-18 0h36v16h-36z`, ink: 'sideB', weight: WEIGHT },
      label(middle - ARM, 112, `A ${names.a}`, 'sideA', true),
      label(middle - ARM, 132, `found only here ${formatCount(counts.onlyA)}, more here ${formatCount(counts.moreA)}`, 'muted'),
      label(middle + ARM, 112, `B ${names.b}`, 'sideB', true),
      label(middle + ARM, 132, `found only here ${formatCount(counts.onlyB)}, more here ${formatCount(counts.moreB)}`, 'muted'),
      label(middle, 152, `features: ${middles.map(([words, count]) => `${words} ${formatCount(count)}`).join(' · ')}`, 'muted'),
      { kind: 'text', x: middle, y: 170, text, ink: 'muted', anchor: 'middle' },
    ],
  }
}
