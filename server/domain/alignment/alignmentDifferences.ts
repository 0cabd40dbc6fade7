import { asc, eq } from 'drizzle-orm'
import { settingDifferences } from '../../../shared/science/alignment/settingDifferences'
import type { Database } from '../../db/open'
import { alignments, alignmentTables, samples, tables } from '../../db/schema'
import type { AlignInput } from './alignInput'

/** What a new alignment does otherwise than an earlier one, as sentences; none where it repeats it. */
export function alignmentDifferences(db: Database, earlierId: string, input: AlignInput): string[] {
  const earlier = db.select({ number: alignments.number, settings: alignments.settings, asGiven: alignments.asGiven }).from(alignments).where(eq(alignments.id, earlierId)).get()
  if (!earlier) return []
  const before = db.select({ sampleName: alignmentTables.sampleName, digest: alignmentTables.tableDigest }).from(alignmentTables).where(eq(alignmentTables.alignmentId, earlierId)).orderBy(asc(alignmentTables.position)).all()
  const now = input.tableIds.flatMap(id => db.select({ sampleName: samples.name, digest: tables.digest }).from(tables).innerJoin(samples, eq(samples.id, tables.sampleId)).where(eq(tables.id, id)).get() ?? [])
  const found = [
    ...settingDifferences(earlier.settings, input.settings),
    ...earlier.asGiven === input.asGiven ? [] : [input.asGiven ? 'The rows of wide tables are taken as given.' : 'Wide tables are aligned anew.'],
    ...tableDifferences(before, now),
  ]
  return found.length > 0 ? found : [`The same settings and tables as alignment ${earlier.number}.`]
}

interface NamedTable { sampleName: string, digest: string }

function tableDifferences(before: NamedTable[], now: NamedTable[]): string[] {
  const digests = (tables: NamedTable[]) => new Map(tables.map(table => [table.sampleName, table.digest]))
  const [was, is] = [digests(before), digests(now)]
  const added = [...is.keys()].filter(name => !was.has(name))
  const gone = [...was.keys()].filter(name => !is.has(name))
  const replaced = [...is].filter(([name, digest]) => was.has(name) && was.get(name) !== digest).map(([name]) => name)
  return [
    ...added.length ? [`Tables added: ${added.join(', ')}.`] : [],
    ...gone.length ? [`Tables no longer in: ${gone.join(', ')}.`] : [],
    ...replaced.length ? [`Tables replaced: ${replaced.join(', ')}.`] : [],
  ]
}
