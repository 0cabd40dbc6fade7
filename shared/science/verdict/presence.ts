/** A side in a feature: none of its preparations detect it, some do, or enough do. */
export const PRESENCE = { notFound: 0, patchy: 1, present: 2 } as const

/** Rounding of shares such as 0.8 × 5 must not cost a preparation. */
const ROUNDING = 1e-9

/** Presence of a side: present where at least the share `presence` of its preparations detect the feature. */
export function presenceOf(detected: number, preparations: number, presence: number): number {
  if (detected === 0) return PRESENCE.notFound
  return detected >= presence * preparations - ROUNDING ? PRESENCE.present : PRESENCE.patchy
}
