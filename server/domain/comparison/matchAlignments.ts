import { asc, eq } from 'drizzle-orm'
import { matchFeatures } from '../../../shared/science/verdict/matchFeatures'
import type { Database } from '../../db/open'
import { unpackFloat64, unpackInt32 } from '../../db/packed'
import { alignmentTables } from '../../db/schema'
import { notFound } from '../DomainError'

/** Lets other requests in between two heavy steps. */
const breathe = () => new Promise<void>(resolve => setImmediate(resolve))

/** The feature before for each feature after, −1 where there is none: followed by the most intense member in tables that both alignments used. */
export async function matchAlignments(db: Database, afterId: string, beforeId: string, features: number): Promise<Int32Array> {
  const tablesOf = (alignmentId: string) => db.select({ id: alignmentTables.id, digest: alignmentTables.tableDigest }).from(alignmentTables)
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
  const waiting = tablesOf(beforeId)
  const shared = tablesOf(afterId).flatMap(({ id, digest }) => {
    const at = waiting.findIndex(candidate => candidate.digest === digest)
    const [twin] = at < 0 ? [] : waiting.splice(at, 1)
    return twin ? [{ after: id, before: twin.id }] : []
  })
  const member: Int32Array[] = []
  const intensity: Float64Array[] = []
  const memberBefore: Int32Array[] = []
  for (const pair of shared) {
    const row = db.select({ member: alignmentTables.member, intensity: alignmentTables.intensity }).from(alignmentTables).where(eq(alignmentTables.id, pair.after)).get()
    const twin = db.select({ member: alignmentTables.member }).from(alignmentTables).where(eq(alignmentTables.id, pair.before)).get()
    if (!row || !twin) throw notFound()
    member.push(unpackInt32(row.member))
    intensity.push(unpackFloat64(row.intensity))
    memberBefore.push(unpackInt32(twin.member))
    await breathe()
  }
  return shared.length > 0 ? matchFeatures(member, intensity, memberBefore) : new Int32Array(features).fill(-1)
}
