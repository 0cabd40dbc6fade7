import { writeCsv } from '../../../shared/formats/delimitedText/writeCsv'
import { sampleKindNames, type SampleInput } from '../../../shared/schemas/sample'

const HEADER = ['name', 'kind', 'side', 'preparation', 'amount', 'amount unit', 'volume (mL)', 'dilution', 'injection (µL)', 'run order', 'batch']

/** A sample sheet as a spreadsheet holds it, to paste or to read in. */
export function sheetCsv(sheet: readonly SampleInput[]): string {
  return writeCsv(HEADER, sheet.map(sample => [
    sample.name, sampleKindNames[sample.kind], sample.side ?? '', sample.preparation, sample.amount ?? '', sample.amount === null ? '' : sample.amountUnit,
    sample.volumeMl ?? '', sample.dilution ?? '', sample.injectionUl ?? '', sample.runOrder ?? '', sample.batch,
  ]))
}
