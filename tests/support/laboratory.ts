import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { readMigrationFiles } from 'drizzle-orm/migrator'
import { bundleWorker } from '../../scripts/bundleWorker'
import { openDatabase, type OpenDatabase } from '../../server/db/open'
import { methods, people, personRoles, studies } from '../../server/db/schema'
import type { Person } from '../../server/domain/person/person'
import { jobKinds } from '../../server/jobs'
import { Jobs } from '../../server/jobs/runner'
import type { Role } from '../../shared/permissions'

const root = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url))
export const migrations = readMigrationFiles({ migrationsFolder: root('drizzle') })

export interface TestLaboratory extends OpenDatabase { folder: string, jobs: Jobs }

/** A laboratory of its own in a temporary folder, for tests of the domain; `workers` are bundled as named. Close it when done. */
export async function openTestLaboratory(workers: string[] = []): Promise<TestLaboratory> {
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-test-'))
  const open = await openDatabase(folder, 'lab', migrations)
  const jobs = new Jobs({ db: open.db, folder }, jobKinds, workerSources(workers))
  return {
    ...open,
    folder,
    jobs,
    close: () => {
      void jobs.stop()
      open.close()
      rmSync(folder, { recursive: true })
    },
  }
}

/** The workers' bundles by name, as a job runner takes them. */
export function workerSources(workers: string[]): Record<string, string> {
  return Object.fromEntries(workers.map(name => [name, bundleWorker(root(`server/workers/${name}.ts`))]))
}

let made = 0

/** A person with these roles; without a password, for tests of the domain. */
export function addTestPerson({ db }: OpenDatabase, ...roles: Role[]): Person {
  const name = `person ${++made}`
  const row = db.insert(people).values({ name, signInName: `person${made}` }).returning().get()
  for (const role of roles) db.insert(personRoles).values({ personId: row.id, role }).run()
  return { id: row.id, name, signInName: row.signInName, roles }
}

/** A study in negative mode, with its method. */
export function addTestStudy({ db }: OpenDatabase, person: Person, { restricted = false } = {}) {
  const method = db.insert(methods).values({ name: `method ${++made}`, polarity: 'negative', createdBy: person.id }).returning().get()
  return db.insert(studies).values({ title: `study ${made}`, methodId: method.id, restricted, createdBy: person.id }).returning().get()
}
