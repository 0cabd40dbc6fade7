import { MOST_MINUTES } from '../../science/numeric/measurable'
import { arrayEncoding, decodeArray } from './decodeArray'
import { MzmlRefused } from './mzmlRefused'
import { ParamList } from './params'
import type { ScanPolarity } from './scanCounts'
import { INTENSITY_ARRAY, MS1_SPECTRUM, MS_LEVEL, MZ_ARRAY, NEGATIVE_SCAN, POSITIVE_SCAN, PROFILE_SPECTRUM, SCAN_START_TIME, UNITS_IN_A_MINUTE } from './terms'

/** Points one scan may have: beyond any instrument, and what bounds the memory of a reading. */
export const MOST_POINTS = 2_000_000

/** One spectrum while it is read. */
export class OpenSpectrum {
  readonly params = new ParamList()
  readonly scanParams = new ParamList()
  /** Elements `scan` seen; a spectrum made of several takes the time of the first. */
  scans = 0
  /** Known once its terms have been read; arrays of a spectrum that is not wanted are passed over. */
  wanted: boolean | null = null
  mz: Float64Array | null = null
  intensity: Float64Array | null = null
  readonly where: string
  private readonly points: number

  constructor(attributes: Record<string, string>) {
    this.where = `Scan “${(attributes.id ?? '').slice(0, 80)}”`
    this.points = this.pointsOf(attributes.defaultArrayLength)
  }

  get level(): number | null {
    const level = Number(this.term(MS_LEVEL)?.value || Number.NaN)
    return Number.isInteger(level) && level > 0 ? level : this.term(MS1_SPECTRUM) ? 1 : null
  }

  get polarity(): ScanPolarity | null {
    return this.term(NEGATIVE_SCAN) ? 'negative' : this.term(POSITIVE_SCAN) ? 'positive' : null
  }

  get profile(): boolean {
    return this.term(PROFILE_SPECTRUM) !== undefined
  }

  /** Null where it does not say a time, or none that a run can have. */
  get minutes(): number | null {
    const time = this.scanParams.find(SCAN_START_TIME)
    if (!time || time.value.trim() === '') return null
    const unit = UNITS_IN_A_MINUTE[time.unitAccession]
    if (unit === undefined) throw new MzmlRefused(`${this.where} gives its time ${time.unitAccession ? `in a unit that is not known (“${time.unitAccession.slice(0, 80)}”)` : 'without a unit'}. Minutes and seconds are read.`)
    const minutes = Number(time.value) / unit
    return minutes >= 0 && minutes < MOST_MINUTES ? minutes : null
  }

  /** Takes one array in: its terms, its own length where it has one, and its text. Arrays of other kinds are passed over. */
  takeArray(params: ParamList, ownLength: string | undefined, text: string): void {
    const kind = params.has(MZ_ARRAY) ? 'mz' : params.has(INTENSITY_ARRAY) ? 'intensity' : null
    if (kind === null) return
    const where = `The ${kind === 'mz' ? 'm/z' : 'intensity'} array of ${this.where.replace('Scan', 'scan')}`
    if (this[kind] !== null) throw new MzmlRefused(`${where} stands there twice.`)
    const length = ownLength === undefined ? this.points : this.pointsOf(ownLength)
    this[kind] = decodeArray(text, length, arrayEncoding(params, where), where)
  }

  /** Its points; none where it has no arrays. */
  take(): { mz: Float64Array, intensity: Float64Array } {
    const { mz, intensity } = this
    if (mz && intensity && mz.length === intensity.length) return { mz, intensity }
    if (mz && intensity) throw new MzmlRefused(`${this.where} has ${mz.length} m/z values and ${intensity.length} intensities. The file is damaged.`)
    if (this.points > 0) throw new MzmlRefused(`${this.where} declares ${this.points} points, but its ${mz ? 'intensities' : 'm/z values'} are not there.`)
    return { mz: new Float64Array(0), intensity: new Float64Array(0) }
  }

  private term(accession: string) {
    return this.params.find(accession) ?? this.scanParams.find(accession)
  }

  private pointsOf(text: string | undefined): number {
    const points = Number(text ?? 0)
    if (!Number.isInteger(points) || points < 0) throw new MzmlRefused(`${this.where} declares “${text?.slice(0, 40)}” points, which is no number.`)
    if (points > MOST_POINTS) throw new MzmlRefused(`${this.where} declares ${points} points; a scan may have ${MOST_POINTS} at most.`)
    return points
  }
}
