const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' })

/** 3 Feb 2026. In UTC, so that server and page write the same. */
export const dayOf = (moment: string | Date) => day.format(new Date(moment))
