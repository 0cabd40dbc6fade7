/** A line through points: minutes ascending, ties allowed, and as many values. */
export interface TraceLine { minutes: Float64Array, values: Float64Array }

/**
 * The mean of several traces whose scans lie at different times. It stands at every time at which any of them has a scan,
 * each being a straight line from scan to scan; so no top of any trace lies between the points of the mean.
 * A trace counts only from its first to its last scan, and not where its value beside is no number.
 *
 * @returns no point where there is no trace; NaN where no trace counts
 */
export function meanTrace(traces: readonly TraceLine[]): TraceLine {
  const [only] = traces
  if (only && traces.length === 1) return { minutes: only.minutes.slice(), values: only.values.slice() }
  const minutes = allTimes(traces)
  const sum = new Float64Array(minutes.length)
  const counted = new Uint16Array(minutes.length)
  for (const trace of traces) addTrace(trace, minutes, sum, counted)
  for (let i = 0; i < sum.length; i++) sum[i] = counted[i]! > 0 ? sum[i]! / counted[i]! : Number.NaN
  return { minutes, values: sum }
}

/** Every time of every trace once, ascending. */
function allTimes(traces: readonly TraceLine[]): Float64Array {
  const all = new Float64Array(traces.reduce((sum, { minutes }) => sum + minutes.length, 0))
  let at = 0
  for (const { minutes } of traces) {
    all.set(minutes, at)
    at += minutes.length
  }
  all.sort()
  let count = 0
  for (let i = 0; i < all.length; i++) if (i === 0 || all[i] !== all[i - 1]) all[count++] = all[i]!
  return all.slice(0, count)
}

function addTrace({ minutes, values }: TraceLine, times: Float64Array, sum: Float64Array, counted: Uint16Array): void {
  const last = minutes.length - 1
  let right = 0
  for (let i = 0; i < times.length; i++) {
    const time = times[i]!
    while (right <= last && minutes[right]! < time) right++
    if (right > last) return
    const value = minutes[right] === time ? tieTop(minutes, values, right) : right === 0 ? Number.NaN : between(minutes, values, right, time)
    if (Number.isNaN(value)) continue
    sum[i]! += value
    counted[i]!++
  }
}

/** The highest of the scans that share a time. */
function tieTop(minutes: Float64Array, values: Float64Array, at: number): number {
  let top = values[at]!
  for (let next = at + 1; minutes[next] === minutes[at]; next++) if (!(values[next]! <= top)) top = values[next]!
  return top
}

function between(minutes: Float64Array, values: Float64Array, right: number, time: number): number {
  const left = right - 1
  return values[left]! + (values[right]! - values[left]!) * (time - minutes[left]!) / (minutes[right]! - minutes[left]!)
}
