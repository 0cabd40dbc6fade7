import { describe, expect, it } from 'vitest'
import { componentTitle } from '../../../app/charts/componentAxis'
import { loadingPoints, loadingSeries, loadingsOption } from '../../../app/charts/componentLoadings'
import { farthestLoadings, loadingsText } from '../../../app/charts/componentLoadingsText'
import { aroundLoading, loadingFrame, loadingMark, loadingMarks } from '../../../app/charts/loadingFrame'
import { componentSamples, samplesByGroup } from '../../../app/charts/componentSamples'
import { scoreGroups, scoresOption } from '../../../app/charts/componentScores'
import { ellipseSentence, scoresText } from '../../../app/charts/componentScoresText'
import { componentsBasis, explainedVariance, rankSentence } from '../../../app/charts/componentWords'
import { chooseFeatures } from '../../../shared/science/components/chooseFeatures'
import { sampleComponents, type SampleComponents } from '../../../shared/science/components/sampleComponents'
import { VERDICT } from '../../../shared/science/verdict/verdicts'
import { dark, light } from '../../../shared/tokens'
import { comparisonInput, none, onA, onB, blank } from '../../support/comparisonInput'
import { manyVerdicts } from '../../support/manyFeatures'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const many = manyVerdicts(600, { perSide: 6 })
const all = componentSamples(many.input.samples, many.settings)
const chosen = chooseFeatures(many.result, many.settings.presence, 'oneSide')
const compute = (samples: typeof all): SampleComponents => sampleComponents({
  intensity: samples.map(({ index }) => many.input.intensity[index] ?? new Float64Array(0)), factors: samples.map(({ factor }) => factor),
  features: chosen.features, scaling: 'none', most: 5,
})
const found = compute(all)
const rows = Int32Array.from({ length: 600 }, (_, i) => i)
const groups = scoreGroups(found, all, 1, 2)
const points = loadingPoints(found, rows, 1, 2)
const series = loadingSeries(points, many.result.columns.verdict, light)
const nameOf = (feature: number) => `feature ${feature + 1}`

describe('samples that take part', () => {
  it('stand by group; factors are the comparison\'s own, 1 for what is of no side', () => {
    expect(all.map(({ group }) => group)).toEqual([...Array.from({ length: 6 }, () => 'A'), ...Array.from({ length: 6 }, () => 'B'), 'blank', 'blank'])
    expect(new Set(all.map(({ index }) => index)).size).toBe(all.length)
    expect(all.at(-1)?.factor).toBe(1)
  })

  it('count as not compared where the comparison leaves them out', () => {
    const { samples } = comparisonInput([onA('M1', [1]), onA('M2', [1], { amount: null }), onB('T1', [1]), blank('blank', [none])])
    const byGroup = samplesByGroup(componentSamples(samples, { normaliseByAmount: true }))
    expect(byGroup.map(({ group, samples: own }) => [group, own.map(({ name }) => name)])).toEqual([['A', ['M1']], ['B', ['T1']], ['blank', ['blank']], ['notCompared', ['M2']]])
  })
})

describe('the plot of scores', () => {
  const option = scoresOption({ found, groups, across: 1, upwards: 2, names, palette: light, narrow: false })
  const drawn = [option.series ?? []].flat()

  it('draws every sample once, in the shape of its group', () => {
    const marks = drawn.filter(each => each.type === 'scatter')
    expect(marks.map(({ id }) => id)).toEqual(['score-A', 'score-B', 'score-blank'])
    expect(marks.flatMap(({ data }) => data as unknown[])).toHaveLength(all.length)
    expect(new Set(marks.map(mark => mark.type === 'scatter' && mark.symbol)).size).toBe(3)
    const first = groups[0]?.samples[0]
    expect([first?.x, first?.y]).toEqual([found.scores[0]?.[0], found.scores[1]?.[0]])
  })

  it('has an ellipse for each group of five and more, and says for which not', () => {
    expect(drawn.filter(each => each.type === 'line').map(({ id }) => id)).toEqual(['ellipse-A', 'ellipse-B'])
    expect(ellipseSentence(groups, names)).toBe('Ellipses hold 95 % of samples like those of Millrace (6), Tallow Lane (6). None for blanks (2): fewer than 5 samples.')
    expect(ellipseSentence(groups.slice(2), names)).toBe('No ellipses: each group has fewer than 5 samples.')
  })

  it('names its axes by the share of the variance', () => {
    expect(option.xAxis).toMatchObject({ name: `PC1, ${(100 * (found.share[0] ?? 0)).toFixed(1)} % of the variance` })
    expect(componentTitle({ share: Float64Array.of(0.4321, 0.2), rank: 2 }, 1)).toBe('PC1, 43.2 % of the variance')
    expect(componentTitle({ share: Float64Array.of(1), rank: 1 }, 2)).toBe('no component 2')
  })

  it('says the name, the group and what was filled under the pointer, without markup', () => {
    const odd = scoresOption({ found, groups: [{ group: 'A', samples: [{ name: '<b>M1</b>', group: 'A', x: -1.234, y: 2, filled: 3 }], ellipse: null }], across: 1, upwards: 2, names, palette: light, narrow: false })
    const { formatter } = odd.tooltip as { formatter: (mark: object) => string }
    expect(formatter({ seriesId: 'score-A', dataIndex: 0 })).toBe(`&lt;b&gt;M1&lt;/b&gt;<br>Millrace<br>PC1 −1.23, PC2 +2<br>3 of ${found.features.length} values filled in`)
    expect(formatter({ seriesId: 'ellipse-A', dataIndex: 0 })).toBe('')
  })

  it('follows the scheme', () => {
    const inDark = JSON.stringify(scoresOption({ found, groups, across: 1, upwards: 2, names, palette: dark, narrow: true }))
    expect(inDark).toContain(dark.sideA)
    expect(inDark).not.toContain(light.sideA)
  })

  it('is told in words', () => {
    const text = scoresText(found, groups, 1, 2, names)
    expect(text).toMatch(/^Across PC1 \([\d.]+ %\); upwards PC2 \([\d.]+ %\)\. Millrace, 6 samples: PC1 [+−]\d/)
    expect(text).toContain('blanks, 2 samples: PC1')
    expect(text).not.toMatch(/NaN|Infinity|undefined/)
  })

  it('stands one component: a line of points', () => {
    const two = all.filter(({ name }) => name === 'M1' || name === 'T1')
    const line = compute(two)
    const lineGroups = scoreGroups(line, two, 1, 2)
    expect(line.rank).toBe(1)
    expect(lineGroups.flatMap(({ samples }) => samples.map(({ y }) => y))).toEqual([0, 0])
    expect(scoresText(line, lineGroups, 1, 2, names)).toMatch(/^Across PC1 \(100\.0 %\); upwards no component 2\. Millrace, 1 sample: PC1 [+−]\d+; /)
    expect(rankSentence(1, 2)).toContain('with a third there is a plane')
  })
})

describe('the plot of loadings', () => {
  it('draws each feature that passes the filter once, in the series of its verdict', () => {
    expect(series.reduce((sum, { features }) => sum + features.length, 0)).toBe(found.features.length)
    for (const { option, features } of series) {
      for (const feature of features) expect(VERDICT[option.name as keyof typeof VERDICT]).toBe(many.result.columns.verdict[feature])
    }
    const few = loadingPoints(found, found.features.slice(0, 7), 1, 2)
    expect([...few.features]).toEqual([...found.features.slice(0, 7)])
  })

  it('keeps feature and loading together', () => {
    const { option, features } = series.find(each => each.features.length > 2) ?? { option: { data: [] }, features: Int32Array.of() }
    const k = found.features.indexOf(features[2] ?? -1)
    const data = option.data as Float64Array
    expect([data[4], data[5]]).toEqual([found.loadings[0]?.[k], found.loadings[1]?.[k]])
  })

  it('finds the feature under the pointer, where it is drawn', () => {
    const frame = loadingFrame(points, 440, null)
    const marks = loadingMarks(frame, points)
    for (const k of [0, 5, points.features.length - 1]) {
      const feature = points.features[k] ?? -1
      const mark = loadingMark(frame, points, feature)
      if (!mark) throw new Error('not drawn')
      expect(mark.x).toBeGreaterThan(frame.pane.left)
      expect(mark.x).toBeLessThan(frame.pane.left + frame.pane.width)
      const found = loadingMark(frame, points, marks.nearest(mark.x, mark.y, 12))
      expect(Math.hypot((found?.x ?? 0) - mark.x, (found?.y ?? 0) - mark.y)).toBeLessThan(0.01)
    }
    expect(marks.nearest(0, 0, 12)).toBe(-1)
    expect(loadingMark(frame, points, -1)).toBeNull()
  })

  it('has axes that hold zero and every loading, and end on marks', () => {
    for (const width of [300, 440, 900]) {
      const { pane, interval } = loadingFrame(points, width, null)
      for (const [ends, values, step] of [[pane.x, points.x, interval?.x ?? 0], [pane.y, points.y, interval?.y ?? 0]] as const) {
        expect(ends[0]).toBeLessThanOrEqual(Math.min(0, ...values))
        expect(ends[1]).toBeGreaterThanOrEqual(Math.max(0, ...values))
        for (const end of ends) expect(Math.abs(end / step - Math.round(end / step))).toBeLessThan(1e-6)
        expect((ends[1] - ends[0]) / step).toBeLessThan(12)
      }
    }
    expect(loadingFrame({ x: Float64Array.of(), y: Float64Array.of(0) }, 0, null).pane.x.every(Number.isFinite)).toBe(true)
  })

  it('shows the surroundings of a feature, and none of one that takes no part', () => {
    const feature = points.features[5] ?? -1
    const shown = aroundLoading(points, feature)
    expect(shown?.x[0]).toBeLessThan(points.x[5] ?? 0)
    expect(shown?.x[1]).toBeGreaterThan(points.x[5] ?? 0)
    const frame = loadingFrame(points, 440, shown)
    expect(loadingsOption({ found, frame, series, across: 1, upwards: 2, palette: light }).xAxis).toMatchObject({ min: shown?.x[0], max: shown?.x[1] })
    expect(loadingMark(frame, points, feature)?.x).toBeCloseTo(frame.pane.left + frame.pane.width / 2, 6)
    expect(aroundLoading(points, -1)).toBeNull()
  })

  it('is drawn where the pointer looks for it', () => {
    const frame = loadingFrame(points, 440, null)
    const option = loadingsOption({ found, frame, series, across: 1, upwards: 2, palette: light })
    expect(option.grid).toMatchObject({ left: frame.pane.left, top: frame.pane.top, width: frame.pane.width, height: frame.pane.height })
    expect(option.yAxis).toMatchObject({ min: frame.pane.y[0], max: frame.pane.y[1] })
  })

  it('ranks by distance from the middle, and names the farthest in words', () => {
    const far = farthestLoadings(points, 10)
    const distances = far.map(({ x, y }) => Math.hypot(x, y))
    expect(distances).toEqual([...distances].sort((a, b) => b - a))
    expect(distances[0]).toBeCloseTo(Math.max(...Array.from(points.x, (x, k) => Math.hypot(x, points.y[k] ?? 0))), 12)
    expect(loadingsText(found, points, 1, 2, nameOf)).toContain(`Farthest out: feature ${(far[0]?.feature ?? 0) + 1} (PC1 `)
    expect(loadingsText(found, loadingPoints(found, Int32Array.of(), 1, 2), 1, 2, nameOf)).toBe('No feature that takes part passes the filter.')
    expect(loadingsText(found, loadingPoints(found, found.features.slice(0, 7), 1, 2), 1, 2, nameOf)).toMatch(/^7 features of \d+ pass the filter/)
  })
})

describe('what the components rest on', () => {
  it('is told with numbers', () => {
    const text = componentsBasis(found, chosen, all, 'oneSide', 'pareto')
    expect(componentsBasis(found, chosen, all, 'oneSide', 'pareto', 2)).toContain('2 samples left out by hand.')
    expect(text).not.toContain('by hand')
    expect(text).toContain(`log2 of ${found.features.length} features present in at least one side, in 14 samples.`)
    expect(text).toMatch(/[\d\u202F]+ of [\d\u202F]+ values \(\d+ %\), in \d+ features, were not detected and are filled with half the feature’s minimum\./)
    expect(text).toContain(`Left out: ${chosen.setAside} set aside, ${chosen.notPresent} not present in at least one side`)
    expect(text).toContain('Pareto scaled')
    expect(text).toContain('Samples of no side stand as injected.')
    expect(componentsBasis({ ...found, filledValues: 0 }, { ...chosen, setAside: 0, notPresent: 0 }, all.slice(0, 12), 'bothSides', 'none')).toMatch(/No value was missing\.$/)
  })

  it('gives the variance of each component and of the rest', () => {
    expect(explainedVariance({ share: Float64Array.of(0.5, 0.25, 0.15, 0.1), rank: 4 }, 2)).toBe('PC1 50.0 %, PC2 25.0 %, 2 more 25.0 %')
    expect(explainedVariance({ share: Float64Array.of(1), rank: 1 }, 5)).toBe('PC1 100.0 %')
  })

  it('says why there is no plot', () => {
    expect(rankSentence(0, 1)).toContain('at least two samples')
    expect(rankSentence(0, 6)).toContain('do not differ')
    expect(rankSentence(1, 6)).toContain('one component only')
    expect(rankSentence(3, 6)).toBe('')
  })
})
