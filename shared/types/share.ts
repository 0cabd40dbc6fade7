import type { ShareState } from '../schemas/share'

/** A share link in the list of a study. */
export interface ShareLinkLine {
  id: string
  /** For whom, as its maker noted it. */
  label: string
  allowExport: boolean
  by: string
  at: string
  comparisonId: string
  comparisonTitle: string
  versionId: string
  versionNumber: number
  endsAt: string
  withdrawnAt: string | null
  state: ShareState
}
