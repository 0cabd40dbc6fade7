import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { appleCompounds, peelCompounds } from '../../../server/domain/demo/compounds'
import { exportFiles } from '../../../server/domain/demo/exportFiles'
import { simulateStudy } from '../../../server/domain/demo/injections'
import { ionsOf } from '../../../server/domain/demo/ions'
import { publicDemoFiles, publicFileNames, publicTraceNames } from '../../../server/domain/demo/publicFiles'
import { demoStudies } from '../../../server/domain/demo/studies'
import { readSheetCsv } from '../../../shared/formats/sampleSheet/readBlock'
import { readCell } from '../../../shared/formats/sampleSheet/readCell'
import { sampleFields } from '../../../shared/schemas/sample'
import { monoisotopicMass } from '../../../shared/science/mass/formula'
import { judgeDemoStudy } from '../../support/judgeDemoStudy'

const folder = fileURLToPath(new URL('../../../public/demo/', import.meta.url))
const masses = JSON.parse(readFileSync(fileURLToPath(new URL('../../reference/data/masses.json', import.meta.url)), 'utf8')) as {
  compounds: { name: string, mass: number, ions: Record<string, number> }[]
}
const [juices, later, peels] = demoStudies

describe('the demo laboratory\'s simulation', () => {
  it('writes the same bytes for the same seed, and these lie in public/demo', () => {
    const files = publicDemoFiles()
    expect(files).toEqual(publicDemoFiles())
    expect(readdirSync(folder).sort()).toEqual(files.map(file => file.name).sort())
    expect([...publicFileNames, ...publicTraceNames, 'README.txt'].sort()).toEqual(files.map(file => file.name).sort())
    for (const { name, text } of files) expect(readFileSync(folder + name, 'utf8') === text, `${name}: run scripts/writeDemoFiles.ts`).toBe(true)
    expect(files.reduce((bytes, { text }) => bytes + Buffer.byteLength(text), 0)).toBeLessThan(2_600_000)
  })

  it('writes a sample sheet that the sheet reads back', () => {
    const csv = publicDemoFiles().find(file => file.name === 'sample-sheet.csv')?.text ?? ''
    const rows = readSheetCsv(csv)?.rows.map(({ cells }) => Object.fromEntries(sampleFields.map((field) => {
      const read = readCell(field, cells[field] ?? '', { sideAName: 'A', sideBName: 'B' })
      return [field, 'value' in read ? read.value : read.sentence]
    })))
    expect(rows).toEqual(juices.sheet)
  })

  it('gives another sample other numbers', () => {
    const { sheet, ...rest } = juices
    const renamed = simulateStudy({ ...rest, sheet: sheet.map(sample => ({ ...sample, name: `${sample.name} again` })) })
    expect(renamed[2]?.intensity).not.toEqual(simulateStudy(juices)[2]?.intensity)
  })

  // masses.json: AME2020 masses by an independent script (tests/reference/data/make-masses.py).
  it.each([
    ['phloridzin', 'phloridzin (phlorizin)', appleCompounds], ['chlorogenic acid', 'chlorogenic acid', appleCompounds],
    ['patulin', 'patulin', appleCompounds], ['5-hydroxymethylfurfural', '5-hydroxymethylfurfural', appleCompounds],
    ['carbendazim', 'carbendazim', peelCompounds], ['thiabendazole', 'thiabendazole', peelCompounds], ['hesperidin', 'hesperidin', peelCompounds],
  ])('knows the true mass and ions of %s', (name, reference, compounds) => {
    const compound = compounds.find(candidate => candidate.name === name)
    const known = masses.compounds.find(candidate => candidate.name === reference)
    if (!compound || !known) throw new Error(`${name} is missing`)
    expect(Math.abs(monoisotopicMass(compound.formula) - known.mass)).toBeLessThan(1e-6)
    const mz = ionsOf([compound]).map(ion => ion.mz)
    for (const adduct of Object.keys(compound.ions)) {
      expect(mz.some(value => Math.abs(value - (known.ions[adduct] ?? Number.NaN)) < 1e-6), adduct).toBe(true)
    }
  })

  it('gives sucrose the ¹³C share of its twelve carbons, and its chloride a ³⁷Cl', () => {
    const sucrose = appleCompounds.filter(compound => compound.name === 'sucrose')
    const ions = ionsOf(sucrose)
    const at = (mz: number) => ions.find(ion => Math.abs(ion.mz - mz) < 2e-4)?.share ?? Number.NaN
    // 12 × 0.0107 / 0.9893; 37Cl over 35Cl 0.2424 / 0.7576 of the chloride's 0.7
    expect(at(342.11229)).toBeCloseTo(0.1298, 4)
    expect(at(379.08266)).toBeCloseTo(0.7 * 0.31996, 4)
  })

  it('has patulin and protocatechuic acid at one m/z and at different times, patulin in one juice alone', () => {
    const [patulin, protocatechuic] = ['patulin', 'protocatechuic acid'].map(name => appleCompounds.find(compound => compound.name === name))
    expect(patulin?.formula).toBe(protocatechuic?.formula)
    const { featuresOf } = judgeDemoStudy(juices)
    const apart = (featuresOf('protocatechuic acid')[0]?.minutes ?? 0) - (featuresOf('patulin')[0]?.minutes ?? 0)
    expect(apart).toBeGreaterThan(0.4)
    expect([patulin?.levelA, patulin?.levelB].filter(level => level === 0)).toHaveLength(1)
  })

  it('writes study 2 in seconds and study 3 as one wide file', () => {
    expect(exportFiles(later).map(file => file.text.split('\n')[0])).toEqual(['Peak;Mass;RT [s];Area', 'Peak;Mass;RT [s];Area', 'Peak;Mass;RT [s];Area'])
    expect(exportFiles(peels).map(file => file.text.split('\n')[0])).toEqual([`m/z,RT (min),${peels.sheet.map(sample => `${sample.name} Area`).join(',')}`])
  })

  it('keeps every sheet within what a comparison takes: weighed in mg, factors within ×3', () => {
    for (const { sheet } of demoStudies) {
      const factors = sheet.filter(sample => sample.kind === 'sample').map(({ amount, volumeMl, dilution, injectionUl }) => (volumeMl ?? 0) * (dilution ?? 0) / (amount ?? 0) / (injectionUl ?? 0))
      expect(Math.max(...factors) / Math.min(...factors)).toBeLessThan(3)
    }
  })
})
