import { wholeNumber } from '../numeric/numberWords'
import { GrowingFloats, GrowingIntegers } from './growingColumn'
import { MAX_TABLE_ROWS, MAX_TABLE_VALUES, type TableLayout } from './layout'
import { isMissing } from './missingWords'
import type { FeatureColumns } from './packColumns'
import { parseNumber } from './parseNumber'
import { Refusals, type RefusedRow, whyNoIntensity, whyNoMz, whyNoTime } from './refusals'
import { type SkippedKind, skippedKind } from './skippedLines'
import { TableRefused } from './tableRefused'

/** The features of one sample of a file. */
export interface SampleFeatures {
  /** The sample's name in a wide table; null in a long one. */
  name: string | null
  features: number
  /** Wide: the share of rows in which nothing was detected. null in a long table. */
  emptyShare: number | null
  /** The columns, made on the call and let go by the builder: call it once. `row` is the row of the wide table that each feature stands in, null in a long one. */
  take: () => FeatureColumns & { row: Int32Array | null }
}

export interface BuiltColumns {
  samples: SampleFeatures[]
  /** Rows with a usable m/z (and time): those of a wide table count although nothing was detected in them. */
  rowsRead: number
  refused: RefusedRow[]
  skipped: Record<SkippedKind, number>
}

/** Turns rows of text into columns of numbers, one row at a time, by a decided layout. Times become minutes; what can't be used is refused with line, column and reason. */
export class ColumnBuilder {
  private readonly mz: GrowingFloats
  private readonly minutes: GrowingFloats
  private readonly intensity: GrowingFloats
  private readonly width: GrowingFloats
  private readonly samples: { intensity: GrowingFloats, minutes: GrowingFloats | null, row: GrowingIntegers }[]
  private readonly refusals = new Refusals()
  private readonly skipped: Record<SkippedKind, number> = { blank: 0, comment: 0, total: 0 }
  private readonly lastColumn: number
  private rows = 0
  private values = 0

  /** `expectedRows`: how many rows the survey counted, so that columns are made in one piece; 0 where that is not known. */
  constructor(private readonly layout: TableLayout, expectedRows = 0) {
    this.mz = new GrowingFloats(expectedRows)
    this.minutes = new GrowingFloats(expectedRows)
    this.intensity = new GrowingFloats(layout.shape === 'long' ? expectedRows : 0)
    this.width = new GrowingFloats(layout.widthColumn === null ? 0 : expectedRows)
    this.samples = layout.sampleColumns.map(sample => ({ intensity: new GrowingFloats(), minutes: sample.minutesColumn === null ? null : new GrowingFloats(), row: new GrowingIntegers() }))
    this.lastColumn = layout.header.length
  }

  /** Reads one row that stands under the header; line is that of its first character. */
  add(row: readonly string[], line: number): void {
    const { layout } = this
    const mzText = row[layout.mzColumn]
    const mz = this.position(mzText)
    if (Number.isNaN(mz)) {
      const kind = skippedKind(row)
      if (kind !== null) {
        this.skipped[kind]++
        return
      }
    }
    if (++this.rows > MAX_TABLE_ROWS) throw new TableRefused(`The file has more than ${wholeNumber(MAX_TABLE_ROWS)} rows, the most that is read.`)
    if (row.length > this.lastColumn && row.slice(this.lastColumn).some(cell => cell.trim() !== '')) {
      this.refusals.add(line, 'the whole line', row.slice(this.lastColumn).join(' '), `the line has ${row.length} cells, the header ${this.lastColumn}`)
      return
    }
    const whyMz = whyNoMz(mzText, mz)
    if (whyMz !== null) return this.refuse(line, layout.mzColumn, mzText, whyMz)
    let minutes = Number.NaN
    if (layout.minutesColumn !== null) {
      const text = row[layout.minutesColumn]
      minutes = this.time(text)
      const why = whyNoTime(text, minutes)
      if (why !== null) return this.refuse(line, layout.minutesColumn, text, why)
    }
    if (layout.shape === 'wide') this.addWide(row, line, mz, minutes)
    else this.addLong(row, line, mz, minutes)
  }

  private addLong(row: readonly string[], line: number, mz: number, minutes: number): void {
    const { layout } = this
    const column = layout.intensityColumn ?? -1
    const intensity = this.value(row[column])
    const why = whyNoIntensity(row[column], intensity)
    if (why !== null) return this.refuse(line, column, row[column], why)
    this.mz.push(mz)
    this.minutes.push(minutes)
    this.intensity.push(intensity)
    if (layout.widthColumn !== null) this.width.push(this.widthOf(row[layout.widthColumn]))
  }

  private addWide(row: readonly string[], line: number, mz: number, minutes: number): void {
    const place = this.mz.length
    this.mz.push(mz)
    this.minutes.push(minutes)
    const { widthColumn } = this.layout
    if (widthColumn !== null) this.width.push(this.widthOf(row[widthColumn]))
    this.layout.sampleColumns.forEach((sample, index) => {
      const text = row[sample.column]
      if (text === undefined || isMissing(text)) return
      const intensity = this.value(text)
      if (intensity === 0) return
      const why = whyNoIntensity(text, intensity)
      if (why !== null) return this.refuse(line, sample.column, text, why)
      let own = Number.NaN
      if (sample.minutesColumn !== null) {
        own = this.time(row[sample.minutesColumn])
        const whyTime = whyNoTime(row[sample.minutesColumn], own)
        if (whyTime !== null) return this.refuse(line, sample.minutesColumn, row[sample.minutesColumn], whyTime)
      }
      if (++this.values > MAX_TABLE_VALUES) throw new TableRefused(`The file holds more than ${wholeNumber(MAX_TABLE_VALUES)} values above zero, the most that is read.`)
      const columns = this.samples[index]
      columns?.intensity.push(intensity)
      columns?.minutes?.push(own)
      columns?.row.push(place)
    })
  }

  /** Ends the reading. Throws TableRefused where no row at all could be used. */
  finish(): BuiltColumns {
    const { layout } = this
    const rowsRead = this.mz.length
    if (rowsRead === 0) {
      const first = this.refusals.rows[0]
      throw new TableRefused(first ? `No row can be used. Line ${first.line}, column ${first.column}: ${first.reason}${first.value === '' ? '' : ` (“${first.value}”)`}.` : 'There are no rows under the header.')
    }
    const { refusals: { rows: refused }, skipped } = this
    if (layout.shape === 'long') {
      const take = () => ({ mz: this.mz.take(), minutes: this.minutes.take(), intensity: this.intensity.take(), width: layout.widthColumn === null ? null : this.width.take(), row: null })
      return { samples: [{ name: null, features: rowsRead, emptyShare: null, take }], rowsRead, refused, skipped }
    }
    const samples = layout.sampleColumns.map((sample, index): SampleFeatures => {
      const features = this.samples[index]?.row.length ?? 0
      return { name: sample.name, features, emptyShare: (rowsRead - features) / rowsRead, take: () => this.takeSample(index) }
    })
    return { samples, rowsRead, refused, skipped }
  }

  private takeSample(index: number): FeatureColumns & { row: Int32Array } {
    const columns = this.samples[index]
    const row = columns?.row.take() ?? new Int32Array(0)
    const gather = (from: GrowingFloats) => Float64Array.from(row, place => from.at(place))
    return {
      mz: gather(this.mz), minutes: columns?.minutes?.take() ?? gather(this.minutes), intensity: columns?.intensity.take() ?? new Float64Array(0),
      width: this.layout.widthColumn === null ? null : gather(this.width), row,
    }
  }

  private position(text: string | undefined): number {
    return text === undefined ? Number.NaN : parseNumber(text, this.layout.decimalMark, this.layout.thousandsMark)
  }

  private time(text: string | undefined): number {
    return this.layout.timeUnit === 'seconds' ? this.position(text) / 60 : this.position(text)
  }

  private value(text: string | undefined): number {
    return text === undefined ? Number.NaN : parseNumber(text, this.layout.intensityDecimalMark, this.layout.intensityThousandsMark)
  }

  /** A width that is no positive number leaves the row usable. */
  private widthOf(text: string | undefined): number {
    const width = this.position(text) / (this.layout.widthUnit === 'seconds' ? 60 : 1)
    return width > 0 && Number.isFinite(width) ? width : Number.NaN
  }

  private refuse(line: number, column: number, text: string | undefined, reason: string): void {
    this.refusals.add(line, this.layout.header[column]?.trim() || `column ${column + 1}`, text ?? '', reason)
  }
}
