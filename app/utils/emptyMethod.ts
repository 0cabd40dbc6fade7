import type { Polarity } from '#shared/schemas/method'

/** A method as it is being typed: an end of a window may still be missing. */
export interface MethodDraft {
  name: string
  column: string
  gradient: string
  polarity: Polarity | null
  voidMinutes: number | null
  divertWindows: { startMinutes: number | null, endMinutes: number | null }[]
  remark: string
}

export const emptyMethod = (): MethodDraft => ({ name: '', column: '', gradient: '', polarity: null, voidMinutes: null, divertWindows: [], remark: '' })
