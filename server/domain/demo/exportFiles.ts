import type { SimulatedTable } from './simulateTable'
import { simulateStudy } from './injections'
import type { DemoStudy } from './studies'

export interface DemoFile { name: string, text: string }

export const fileNameOf = (sampleName: string) => `${sampleName}.csv`

/** The study's exported files as an instrument's software might have written them: one a sample, or one wide file. */
export function exportFiles(study: DemoStudy): DemoFile[] {
  const tables = simulateStudy(study)
  if (study.fileStyle === 'wide') return [{ name: `${study.seed}.csv`, text: wideText(study.sheet.map(sample => sample.name), tables) }]
  const textOf = study.fileStyle === 'minutes' ? minutesText : secondsText
  return study.sheet.map((sample, index) => ({ name: fileNameOf(sample.name), text: textOf(tables[index]!) }))
}

/** Comma and decimal point, minutes. */
function minutesText({ mz, retentionMinutes, intensity }: SimulatedTable): string {
  return text('m/z,RT (min),Area', mz.map((value, row) => [value.toFixed(4), retentionMinutes[row]!.toFixed(3), intensity[row]!.toFixed(0)].join(',')))
}

/** Semicolon and decimal comma, seconds, the mass under a word that could also mean a neutral mass. */
function secondsText({ mz, retentionMinutes, intensity }: SimulatedTable): string {
  const comma = (value: number, decimals: number) => value.toFixed(decimals).replace('.', ',')
  return text('Peak;Mass;RT [s];Area', mz.map((value, row) => [row + 1, comma(value, 4), comma(retentionMinutes[row]! * 60, 1), comma(intensity[row]!, 1)].join(';')))
}

/** A row an ion and a column a sample; an ion's m/z and time are the means over the samples that show it, a missing one is an empty cell. */
function wideText(names: string[], tables: readonly SimulatedTable[]): string {
  const cells = new Map<number, { mz: number[], minutes: number[], areas: string[] }>()
  tables.forEach((table, column) => table.ion.forEach((ion, row) => {
    if (ion < 0) return
    const cell = cells.get(ion) ?? { mz: [], minutes: [], areas: names.map(() => '') }
    cell.mz.push(table.mz[row]!)
    cell.minutes.push(table.retentionMinutes[row]!)
    cell.areas[column] = table.intensity[row]!.toFixed(0)
    cells.set(ion, cell)
  }))
  const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length
  const rows = [...cells.values()].map(({ mz, minutes, areas }) => ({ mz: mean(mz), minutes: mean(minutes), areas })).sort((a, b) => a.mz - b.mz || a.minutes - b.minutes)
  return text(['m/z', 'RT (min)', ...names.map(name => `${name} Area`)].join(','), rows.map(row => [row.mz.toFixed(4), row.minutes.toFixed(3), ...row.areas].join(',')))
}

const text = (header: string, rows: string[]) => `${header}\n${rows.join('\n')}\n`
