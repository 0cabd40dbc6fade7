import type { OpenDatabase, LaboratoryKind } from '../db/open'
import type { Jobs } from '../jobs/runner'

export interface Laboratory extends OpenDatabase {
  kind: LaboratoryKind
  /** The data folder. */
  folder: string
  jobs: Jobs
}

let open: Laboratory | undefined

/** Set once by the start-up plugin. */
export function setLaboratory(laboratory: Laboratory | undefined) {
  open = laboratory
}

/** The open laboratory: database, data folder, jobs. */
export function useLaboratory(): Laboratory {
  if (!open) throw new Error('The laboratory is not open yet.')
  return open
}
