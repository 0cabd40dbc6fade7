import type { UsedTrace } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { standingTraces, usedTraces, type AlignedTrace } from './alignedTraces'

/**
 * The raw data that a version of a comparison is drawn with in its study: what it looked into, and where it looked into none
 * what stands now for its samples. Whoever calls has looked at the right to see the version.
 */
export function versionTraces(db: Database, version: { alignmentId: string, traces: readonly UsedTrace[] }): AlignedTrace[] {
  return version.traces.length > 0 ? usedTraces(db, version.alignmentId, version.traces) : standingTraces(db, version.alignmentId)
}
