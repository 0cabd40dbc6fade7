import { roundedMinutes, type TimeWindow } from '~/utils/traceView'

/** No narrower, minutes: some three scans. */
const NARROWEST = 0.05
/** To each side of a feature that is zoomed to, minutes. */
const AROUND = 0.5

/** The window moved and cut to lie within the run; never narrower than can be drawn. */
export function withinRun([from, to]: TimeWindow, [start, end]: TimeWindow): [number, number] {
  const span = Math.min(Math.max(to - from, NARROWEST), Math.max(end - start, NARROWEST))
  const first = Math.min(Math.max(from, start), Math.max(start, end - span))
  return [roundedMinutes(first), roundedMinutes(first + span)]
}

/** Narrower or wider around its middle; null: the whole run. */
export function zoomedBy(window: TimeWindow, run: TimeWindow, factor: number): [number, number] | null {
  const middle = (window[0] + window[1]) / 2
  const half = (window[1] - window[0]) * factor / 2
  if (2 * half >= run[1] - run[0]) return null
  return withinRun([middle - half, middle + half], run)
}

/** Moved by a share of its own width. */
export function movedBy(window: TimeWindow, run: TimeWindow, share: number): [number, number] {
  const by = (window[1] - window[0]) * share
  return withinRun([window[0] + by, window[1] + by], run)
}

/** Half a minute to each side of a time. */
export function around(minutes: number, run: TimeWindow): [number, number] {
  return withinRun([minutes - AROUND, minutes + AROUND], run)
}

export const isSameWindow = (one: TimeWindow | null, other: TimeWindow | null) => one?.[0] === other?.[0] && one?.[1] === other?.[1]

/** Room around the plot, CSS pixels; the same in the drawing and for whatever lies over it. */
export interface PlotFrame { left: number, right: number, top: number, bottom: number }
export const plotFrame = (narrow: boolean): PlotFrame => ({ left: narrow ? 70 : 96, right: 12, top: 10, bottom: 42 })

/** Width of the plot within a drawing, CSS pixels. */
export const plotWidth = (drawingWidth: number, { left, right }: PlotFrame) => Math.max(1, drawingWidth - left - right)

/** Time under a place of the drawing, and back. */
export function timeAt(x: number, drawingWidth: number, frame: PlotFrame, [from, to]: TimeWindow): number {
  const share = Math.min(1, Math.max(0, (x - frame.left) / plotWidth(drawingWidth, frame)))
  return from + share * (to - from)
}
export function pixelAt(minutes: number, drawingWidth: number, frame: PlotFrame, [from, to]: TimeWindow): number {
  return frame.left + (minutes - from) / (to - from) * plotWidth(drawingWidth, frame)
}
