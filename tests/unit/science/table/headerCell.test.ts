import { describe, expect, it } from 'vitest'
import { readHeaderCell } from '../../../../shared/science/table/headerCell'

describe('a header cell', () => {
  it.each([
    'm/z', 'mz', 'M/Z', 'm / z', 'Measured m/z', 'precursor_mz', 'Mass-to-charge ratio', 'mass to charge', '# m/z', 'm/z (Th)',
  ])('%j is m/z', text => expect(readHeaderCell(text)).toMatchObject({ role: 'mz', mass: 'mz' }))

  it.each([['Mass', 'unsaid', false], ['Masse (Da)', 'unsaid', true], ['Exact mass', 'unsaid', false], ['Neutral mass [Da]', 'neutral', true], ['Molecular Weight', 'neutral', false], ['Masse neutre', 'neutral', false], ['m/z (Da)', 'mz', true]])(
    '%j may be a neutral mass', (text, mass, dalton) => expect(readHeaderCell(text)).toMatchObject({ role: 'mz', mass, dalton }))

  it.each([['RT', null], ['RT (min)', 'minutes'], ['rt_seconds', 'seconds'], ['Retention Time [sec]', 'seconds'], ['RetentionTime', null], ['Retentionszeit (Min.)', 'minutes'], ['Temps de rétention (min)', 'minutes'], ['tR / s', 'seconds'], ['Zeit in Sekunden', 'seconds'], ['R.T.', null], ['RTmin', 'minutes'], ['Ret. time, min', 'minutes']])(
    '%j is a retention time', (text, time) => expect(readHeaderCell(text)).toMatchObject({ role: 'minutes', time, rest: '' }))

  it.each([['Area', 'area'], ['Peak area', 'area'], ['PeakArea', 'area'], ['Fläche', 'area'], ['Peakfläche', 'area'], ['Aire du pic', 'area'], ['Height', 'height'], ['Höhe', 'height'], ['Hauteur', 'height'], ['Max. intensity', 'height'], ['Intensity', 'unknown'], ['Intensität', 'unknown'], ['Intensité', 'unknown'], ['Response', 'unknown'], ['Abundance (counts)', 'unknown'], ['Total area', 'area']])(
    '%j is an intensity: %s', (text, measure) => expect(readHeaderCell(text)).toMatchObject({ role: 'intensity', measure, rest: '' }))

  it.each(['m/z error (ppm)', 'Delta m/z', 'Theoretical m/z', 'RT start', 'RT end', 'Area %', 'Relative area', 'S/N', 'Charge', 'Ladung', 'Adduct', 'Score', 'log2 intensity', 'Area (%)'])(
    '%j is none of them', text => expect(readHeaderCell(text).role).toBe('other'))

  it.each([['Press A1 Area', 'area', 'Press A1'], ['Area Press A1', 'area', 'Press A1'], ['Äpfel_1: Height', 'height', 'Äpfel_1'], ['Intensity [QC high 2]', 'unknown', '[QC high 2]'], ['2024-01-05 Press.raw Peak area', 'area', '2024-01-05 Press.raw']])(
    '%j belongs to a sample', (text, measure, rest) => expect(readHeaderCell(text)).toMatchObject({ role: 'intensity', measure, rest, rank: 2 }))

  it.each(['Press A1', 'Blank mass 1', 'QC1', '', '   ', 'Ölprobe RT 3 b'])('%j says nothing of the trade', text => expect(readHeaderCell(text).role).toBeNull())

  it('that is too long for a title is none, and takes no time', () => {
    expect(readHeaderCell(`area x${' -'.repeat(100_000)}`).role).toBeNull()
    expect(readHeaderCell('('.repeat(200_000)).role).toBeNull()
  })
})
