import { describe, expect, it } from 'vitest'
import { demoStudies } from '../../../server/domain/demo/studies'
import { REASONS } from '../../../shared/science/verdict/reasons'
import { judgeDemoStudy } from '../../support/judgeDemoStudy'

const [juices, later, peels] = demoStudies.map(judgeDemoStudy) as [ReturnType<typeof judgeDemoStudy>, ReturnType<typeof judgeDemoStudy>, ReturnType<typeof judgeDemoStudy>]
/** Most tables hold the compound itself; a split peak or noise beside it stands in few. */
const verdictOf = (study: typeof juices, name: string) => study.featuresOf(name).sort((a, b) => b.tables - a.tables)[0]?.verdict

describe('what the demo laboratory shows at default settings', () => {
  it('has every verdict, in numbers worth looking at', () => {
    const { counts } = juices.result
    const between = (count: number, low: number, high: number) => count >= low && count <= high
    expect({
      onlyA: between(counts.onlyA, 25, 60), onlyB: between(counts.onlyB, 8, 25),
      moreA: between(counts.moreA, 70, 140), moreB: between(counts.moreB, 70, 140),
      level: between(counts.level, 400, 900), unsettled: counts.unsettled > 100, setAside: counts.setAside > 50, inNeither: counts.inNeither > 0,
    }, JSON.stringify(counts)).toEqual({ onlyA: true, onlyB: true, moreA: true, moreB: true, level: true, unsettled: true, setAside: true, inNeither: true })
    for (const [i, table] of juices.tables.entries()) {
      if (['sample', 'pooledQc'].includes(demoStudies[0].sheet[i]?.kind ?? '')) expect(between(table.mz.length, 1100, 1800), String(table.mz.length)).toBe(true)
    }
  })

  it.each([
    ['5-hydroxymethylfurfural', 'onlyB'], ['patulin', 'onlyA'], ['phloridzin', 'moreA'], ['chlorogenic acid', 'moreA'], ['ascorbic acid', 'moreB'],
    ['protocatechuic acid', 'level'], ['sucrose', 'level'], ['fructose and glucose', 'level'], ['malic acid', 'level'], ['citric acid', 'level'], ['quinic acid', 'level'],
    ['palmitic acid', 'setAside'],
  ])('juices: %s is %s', (name, verdict) => {
    expect(verdictOf(juices, name)).toBe(verdict)
  })

  it('sets aside what leaves with the unretained front', () => {
    const { columns } = juices.result
    const reasons = [...columns.reason].filter((_, i) => (columns.retentionMinutes[i] ?? 0) <= 0.8).map(code => REASONS[code])
    expect(reasons.filter(reason => reason === 'divert').length).toBeGreaterThan(10)
    expect(reasons.every(reason => reason === 'divert' || reason === 'inNeither')).toBe(true)
  })

  it('takes out the offset and the drift of the run', () => {
    expect(juices.aligned.drift.filter(drift => drift.offsetApplied).length).toBeGreaterThan(5)
    for (const drift of juices.aligned.drift) {
      expect(drift.residualMedianPpm).toBeLessThan(2)
      expect(drift.residualMedianMinutes).toBeLessThan(0.02)
    }
  })

  it('two months later says that its precision is assumed, and finds no patulin', () => {
    expect(later.result.testedFeatures).toBe(0)
    expect(later.result.cautions.join(' ')).toContain('Assumed precision')
    expect(later.featuresOf('patulin')).toEqual([])
    expect(verdictOf(later, '5-hydroxymethylfurfural')).toBe('onlyB')
    expect(verdictOf(later, 'phloridzin')).toBe('moreA')
  })

  it.each([['carbendazim', 'onlyB'], ['thiabendazole', 'onlyB'], ['imazalil', 'onlyB'], ['hesperidin', 'level'], ['tangeretin', 'moreA']])('peels: %s is %s', (name, verdict) => {
    expect(verdictOf(peels, name)).toBe(verdict)
  })
})
