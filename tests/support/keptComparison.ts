import { gzipSync } from 'node:zlib'
import { and, eq } from 'drizzle-orm'
import type { OpenDatabase } from '../../server/db/open'
import { comparisonVersions } from '../../server/db/schema'
import { alignmentData } from '../../server/domain/comparison/alignmentData'
import { keepVersion } from '../../server/domain/comparison/keepVersion'
import { snapshotSamples } from '../../server/domain/comparison/snapshotSamples'
import { storeSample } from '../../server/domain/comparison/storedSample'
import { packVerdicts } from '../../shared/formats/verdictColumns'
import { decideVerdicts } from '../../shared/science/verdict/decideVerdicts'
import { comparisonDefaults, type ComparisonSettings } from '../../shared/science/verdict/settings'
import { summariseSides } from '../../shared/science/verdict/summariseSides'
import type { UsedTrace } from '../../shared/types/trace'

/** A comparison with one version, judged and kept without a job; of an alignment made by addComparedAlignment. Its `traces` cover no feature. Gives its id. */
export function addKeptComparison({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, alignmentId: string, { practice = false, title = 'Millrace against Tallow Lane', settings = {} as Partial<ComparisonSettings>, comparisonId = null as string | null, traces = [] as UsedTrace[] } = {}) {
  const all = { ...comparisonDefaults, ...settings }
  const samples = snapshotSamples(db, alignmentId).map(sample => ({ ...sample, floor: Number.isNaN(sample.floor) ? 10 : sample.floor }))
  const data = alignmentData(db, alignmentId)
  const notCovered = new Float64Array(data.mz.length).fill(Number.NaN)
  const traceMaxima = samples.map((_, position) => traces.some(trace => trace.position === position) ? notCovered : null)
  const result = decideVerdicts(summariseSides({ ...data, samples, traceMaxima, normaliseByAmount: all.normaliseByAmount }), all)
  return keepVersion(db, studyId, { comparisonId, title, practice, alignmentId, sideAName: 'Millrace', sideBName: 'Tallow Lane', settings: all, samples: samples.map(storeSample), traces },
    { samples, counts: result.counts, cautions: result.cautions, columns: gzipSync(packVerdicts(result)), maxima: traces.map(({ traceId }) => ({ traceId, maxima: notCovered })) }, createdBy)
}

/** The id of a version by its number. */
export function versionIdOf({ db }: Pick<OpenDatabase, 'db'>, comparisonId: string, number = 1): string {
  const version = db.select({ id: comparisonVersions.id }).from(comparisonVersions).where(and(eq(comparisonVersions.comparisonId, comparisonId), eq(comparisonVersions.number, number))).get()
  if (!version) throw new Error(`comparison ${comparisonId} has no version ${number}`)
  return version.id
}
