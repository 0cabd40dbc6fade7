import { describe, expect, it } from 'vitest'
import { driftOption, driftText, greatestShift, mostDrifting } from '../../../app/charts/driftCurves'
import { groupSizesOption, groupSizesText } from '../../../app/charts/groupSizes'
import { massErrorOption, massErrorText } from '../../../app/charts/massErrors'
import { light } from '../../../shared/tokens'

describe('group sizes', () => {
  it('say how many stood in one table, in most and in all', () => {
    expect(groupSizesText([10, 5, 5, 80])).toBe('10 aligned features (10 %) stood in one table alone, 85 (85 %) in more than half of the 4 tables, 80 (80 %) in all of them.')
    expect(groupSizesText([1])).toBe('1 aligned feature (100 %) stood in one table alone.')
    expect(groupSizesText([0, 0])).toBe('No aligned features.')
    expect(groupSizesText([999, 1])).toContain('1 (0.1 %) in all of them')
  })
  it('are drawn as a bar a size', () => {
    expect(groupSizesOption([10, 5], light)).toMatchObject({ xAxis: { data: ['1', '2'] }, series: [{ data: [10, 5] }] })
  })
})

describe('drift', () => {
  const tables = [
    { sampleName: 'juice 1', drift: [[1, 0.02], [5, -0.12], [9, 0.01]] as [number, number][] },
    { sampleName: 'juice 2', drift: [] },
    { sampleName: 'juice 3', drift: [[1, 0.05]] as [number, number][] },
  ]
  it('names the table that drifts most and the chosen one', () => {
    expect(mostDrifting(tables)).toBe(0)
    expect(driftText(tables, 0)).toBe('The times of 2 of 3 tables were corrected. juice 1 drifts most: −0.120 min at 5.0 min.')
    expect(driftText(tables, 1)).toContain('juice 2 was not corrected.')
    expect(driftText(tables, 2)).toContain('juice 3: at most +0.050 min, at 1.0 min.')
    expect(driftText([{ sampleName: 'x', drift: [] }], 0)).toBe('No table\'s times were corrected.')
    expect(greatestShift({ drift: [] })).toBeNull()
  })
  it('draws each table, the chosen one by colour and width', () => {
    expect(driftOption(tables, 2, light)).toMatchObject({ series: [{ lineStyle: { width: 1 } }, { data: [] }, { lineStyle: { width: 3, color: light.focus } }] })
  })
})

describe('mass error', () => {
  const table = (sampleName: string, offsetPpm: number, offsetApplied: boolean, residualMedianPpm: number | null) => ({ sampleName, offsetPpm, offsetApplied, residualMedianPpm })
  it('says which offsets were taken out and what is left', () => {
    expect(massErrorText([table('a', -4.02, true, 1.2), table('b', 0.3, false, 0.9), table('c', 0, false, null)]))
      .toBe('A mass offset was taken out of 1 table: a −4.0 ppm. Afterwards half of the shared features lie within 0.9 to 1.2 ppm of their group\'s centre, by table.')
    expect(massErrorText([table('b', 0.3, false, null)])).toBe('No mass offset was taken out.')
    expect(massErrorText([])).toBe('No tables.')
  })
  it('draws an offset that was left hollow, and nothing where nothing is shared', () => {
    expect(massErrorOption([table('a', -4, true, 1), table('b', 0.3, false, null)], light)).toMatchObject({
      series: [{ data: [{ itemStyle: { color: light.focus } }, { itemStyle: { color: 'transparent' } }] }, { data: [1, '-'] }],
    })
  })
})
