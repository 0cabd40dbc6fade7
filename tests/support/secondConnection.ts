import { openBeside } from '../../server/db/openBeside'
import { Jobs } from '../../server/jobs/runner'
import type { TestLaboratory } from './laboratory'

/** The database of a running server, for a test to look into and prepare; its jobs are never run from here. */
export function secondConnection(folder: string): TestLaboratory {
  const open = openBeside(folder)
  return { ...open, folder, jobs: new Jobs({ db: open.db, folder }, {}, {}) }
}
