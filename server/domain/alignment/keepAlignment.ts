import { eq, max } from 'drizzle-orm'
import { ENGINE_VERSION } from '../../../shared/science/engineVersion'
import type { Database } from '../../db/open'
import { packFloat64, packInt32 } from '../../db/packed'
import { alignments, alignmentTables, samples, tables } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import { touchStudy } from '../study/touchStudy'
import type { AlignedResult, AlignInput } from './alignInput'
import { alignmentDifferences } from './alignmentDifferences'

/** Writes an alignment in the transaction that ends its job; nothing of it is changed afterwards. Returns its id. */
export function keepAlignment(db: Database, studyId: string, input: AlignInput, { result, intensity }: AlignedResult, personId: string): string {
  const last = db.select({ number: max(alignments.number) }).from(alignments).where(eq(alignments.studyId, studyId)).get()
  const number = (last?.number ?? 0) + 1
  const { id } = db.insert(alignments).values({
    studyId, number, practice: input.practice, asGiven: input.asGiven, settings: input.settings, engineVersion: ENGINE_VERSION,
    rerunOf: input.rerunOf, differs: input.rerunOf ? alignmentDifferences(db, input.rerunOf, input) : [],
    groups: result.mz.length, reference: result.reference,
    mz: packFloat64(result.mz), retentionMinutes: packFloat64(result.retentionMinutes), groupSize: packInt32(result.groupSize),
    neighbourStart: packInt32(result.neighbourStart), neighbourList: packInt32(result.neighbourList), createdBy: personId,
  }).returning({ id: alignments.id }).get()
  input.tableIds.forEach((tableId, position) => keepTable(db, id, tableId, position, { result, intensity }))
  if (!input.practice) touchStudy(db, studyId)
  record(db, { personId, action: 'run alignment', studyId, subjectId: id, detail: `Alignment ${number}${input.practice ? ', practice' : ''}: ${input.tableIds.length} tables, ${result.mz.length} aligned features` })
  return id
}

function keepTable(db: Database, alignmentId: string, tableId: string, position: number, { result, intensity }: AlignedResult) {
  const row = db.select({ digest: tables.digest, sampleId: samples.id, sampleName: samples.name }).from(tables).innerJoin(samples, eq(samples.id, tables.sampleId)).where(eq(tables.id, tableId)).get()
  const drift = result.drift[position]
  const [member, corrected, leftOut, values] = [result.members[position], result.correctedMinutes[position], result.leftOut[position], intensity[position]]
  if (!row || !drift || !member || !corrected || !leftOut || !values) throw new DomainError('conflict', 'A table was taken away or lost its sample meanwhile. Start it again.')
  db.insert(alignmentTables).values({
    alignmentId, position, tableId, sampleId: row.sampleId, sampleName: row.sampleName, tableDigest: row.digest,
    intensity: packFloat64(values), member: packInt32(member), correctedMinutes: packFloat64(corrected),
    leftOutRow: packInt32(leftOut.rows), leftOutGroup: packInt32(leftOut.groups),
    offsetPpm: drift.offsetPpm, offsetApplied: drift.offsetApplied, timeCorrected: drift.timeCorrected, landmarks: drift.landmarks, driftReason: drift.reason,
    driftMinutes: packFloat64(drift.knotMinutes), driftShift: packFloat64(drift.knotShiftMinutes),
    residualMedianPpm: finiteOrNull(drift.residualMedianPpm), residualMedianMinutes: finiteOrNull(drift.residualMedianMinutes),
  }).run()
}

const finiteOrNull = (value: number) => Number.isFinite(value) ? value : null
