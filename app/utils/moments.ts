const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' })
const minute = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit', timeZone: 'UTC', timeZoneName: 'short' })

/** 3 Feb 2026. In UTC, so that server and page write the same. */
export const dayOf = (moment: string | Date) => day.format(new Date(moment))
/** 3 Feb 2026, 09:15 UTC. */
export const minuteOf = (moment: string | Date) => minute.format(new Date(moment))
