/** The two sides can't be compared as they stand; the message says why and what to do. */
export class CannotCompare extends Error {}
