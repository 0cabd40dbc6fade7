/**
 * The first of `count` places at which something holds that, once it holds, holds at all that follow; `count` where it holds at none.
 * By halving, so that a million places take twenty looks.
 */
export function firstPlace(count: number, holds: (place: number) => boolean): number {
  let low = 0
  let high = count
  while (low < high) {
    const middle = (low + high) >>> 1
    if (holds(middle)) high = middle
    else low = middle + 1
  }
  return low
}

/** The first place of an ascending column whose value is not below `value`; its length where all are. */
export const firstNotBelow = (ascending: Float64Array, value: number): number => firstPlace(ascending.length, place => !(ascending[place]! < value))

/** The first place of an ascending column whose value is above `value`; its length where none is. */
export const firstAbove = (ascending: Float64Array, value: number): number => firstPlace(ascending.length, place => !(ascending[place]! <= value))
