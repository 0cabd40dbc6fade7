/** A peak that could be labelled. */
export interface PeakMark {
  feature: number
  side: 'A' | 'B'
  minutes: number
  /** Height above the middle line as drawn, on its side. */
  height: number
  /** Why: looked at or flagged. */
  why: 'selected' | 'picked' | 'flagged'
  text: string
}

/** CSS pixels of the plot, and what they stand for. */
export interface LabelRoom {
  width: number
  height: number
  fromMinutes: number
  toMinutes: number
  /** Value at the upper and, mirrored, the lower edge. */
  highest: number
}

/** CSS pixels: height of a label, width of a character, its distance from what it stands clear of, how far it may be lifted (if picked, among others), and in what steps. */
const LINE = 16
const CHARACTER = 7
const GAP = 8
const HIGHEST_LIFT = 64
const HIGHEST_PICKED_LIFT = 120
const STEP = 2
/** No more labels, however much room there is. */
const MOST = 14

/** A mark that got a label, and how many pixels the label is lifted off it to stand clear of the lines beside. */
export interface LabelledMark extends PeakMark { lift: number }

interface Box { left: number, right: number, top: number, bottom: number }
const overlap = (one: Box, other: Box) => one.left < other.right && other.left < one.right && one.top < other.bottom && other.top < one.bottom

/**
 * The marks that get a label, so few that none overlaps another, the lines, or what stands in the corners: what is looked at
 * first, one above the other where they stand close, then flagged ones from the highest down. Marks outside the window get none; the selected one always gets one.
 * @param topBetween the highest drawn on a side between two times
 * @returns as many as fit, in the order in which they were given room
 */
export function chooseLabels(marks: readonly PeakMark[], room: LabelRoom, topBetween: (side: 'A' | 'B', fromMinutes: number, toMinutes: number) => number, corners: readonly Box[] = []): LabelledMark[] {
  const rank = { selected: 0, picked: 1, flagged: 2 }
  const order = [...marks].sort((one, other) => rank[one.why] - rank[other.why] || other.height - one.height || one.feature - other.feature)
  const chosen: LabelledMark[] = []
  const taken = [...corners]
  const perPixel = (room.toMinutes - room.fromMinutes) / room.width
  for (const mark of order) {
    if (chosen.length >= MOST) break
    if (mark.minutes < room.fromMinutes || mark.minutes > room.toMinutes) continue
    const beside = mark.text.length * CHARACTER / 2 * perPixel
    const clear = topBetween(mark.side, mark.minutes - beside, mark.minutes + beside) - mark.height
    const needed = Math.max(0, clear / room.highest * room.height / 2)
    const lift = mark.why === 'selected' ? Math.min(needed, HIGHEST_LIFT) : freeLift(mark, needed, room, taken)
    if (lift === null) continue
    const labelled = { ...mark, lift }
    taken.push(boxOf(labelled, room))
    chosen.push(labelled)
  }
  return chosen
}

/** How far a label must be lifted to stand free: what is looked at goes up step by step, what is flagged only clear of the lines drawn. Null: too far. */
function freeLift(mark: PeakMark, needed: number, room: LabelRoom, taken: readonly Box[]): number | null {
  const most = mark.why === 'picked' ? HIGHEST_PICKED_LIFT : Math.min(needed, HIGHEST_LIFT)
  for (let lift = needed; lift <= most; lift += STEP) {
    const box = boxOf({ ...mark, lift }, room)
    if ((lift === needed || (box.top >= 0 && box.bottom <= room.height)) && !taken.some(each => overlap(each, box))) return lift
  }
  return null
}

/** Where the label of a mark stands: above its top on side A, below it on side B. */
function boxOf(mark: LabelledMark, room: LabelRoom): Box {
  const middle = (mark.minutes - room.fromMinutes) / (room.toMinutes - room.fromMinutes) * room.width
  const half = mark.text.length * CHARACTER / 2
  const away = mark.height / room.highest * room.height / 2 + mark.lift + GAP
  const top = mark.side === 'A' ? room.height / 2 - away - LINE : room.height / 2 + away
  return { left: middle - half, right: middle + half, top, bottom: top + LINE }
}
