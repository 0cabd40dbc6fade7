import { GrowingFloats } from '../table/growingColumn'
import { scanSignal } from './scanSignal'
import { timeOrder } from './timeOrder'

/** Total and base peak of a run, a value a scan in the order of time. */
export interface RunTraces { minutes: Float64Array, total: Float64Array, base: Float64Array }

/** Gathers total and base peak traces scan by scan, in whatever order the scans come. */
export class TraceGatherer {
  private readonly minutes = new GrowingFloats()
  private readonly total = new GrowingFloats()
  private readonly base = new GrowingFloats()
  /** Points of no measurement so far: in no trace. */
  odd = 0

  get scans(): number {
    return this.minutes.length
  }

  /** @returns the scan's place in the order of coming */
  add(minutes: number, mz: Float64Array, intensity: Float64Array): number {
    const { total, base, odd } = scanSignal(mz, intensity)
    this.minutes.push(minutes)
    this.total.push(total)
    this.base.push(base)
    this.odd += odd
    return this.minutes.length - 1
  }

  /** The traces in the order of time, and the place there of each scan as it came. */
  take(): { traces: RunTraces, place: Int32Array } {
    const minutes = this.minutes.take()
    const { order, place } = timeOrder(minutes)
    const ordered = (values: Float64Array) => Float64Array.from(order, scan => values[scan]!)
    return { traces: { minutes: ordered(minutes), total: ordered(this.total.take()), base: ordered(this.base.take()) }, place }
  }
}
