/** Counts lie below: above any detector, and low enough that sums and normalised values stay finite. */
export const MOST_COUNTS = 1e30

/** Retention times lie below, in minutes: ten weeks, far beyond any run, and low enough for an axis. */
export const MOST_MINUTES = 1e5
