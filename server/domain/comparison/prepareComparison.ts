import { eq } from 'drizzle-orm'
import { can } from '../../../shared/permissions'
import type { NewComparisonInput, NewVersionInput } from '../../../shared/schemas/comparison'
import { ENGINE_VERSION } from '../../../shared/science/engineVersion'
import { CannotCompare } from '../../../shared/science/normalisation/cannotCompare'
import { chooseSamples } from '../../../shared/science/verdict/chooseSamples'
import { comparisonDefaults, type ComparedSample, type ComparisonSettings } from '../../../shared/science/verdict/settings'
import type { Database } from '../../db/open'
import { methods } from '../../db/schema'
import { findVisibleAlignment } from '../alignment/findVisibleAlignment'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import type { VisibleStudy } from '../study/findVisibleStudy'
import type { CompareInput } from './compareInput'
import { findComparison, findVersion } from './findComparison'
import { snapshotSamples, withSides } from './snapshotSamples'
import { readSamples, storeSample } from './storedSample'
import { tracesFrom, tracesToUse } from './tracesToUse'
import { versionDifferences } from './versionDifferences'

/** Checks what a new comparison needs and gives the input of its job. A comparison on a practice alignment is a practice copy. */
export function prepareComparison(db: Database, study: VisibleStudy, input: NewComparisonInput, person: Person): CompareInput {
  const alignment = findVisibleAlignment(db, study.id, input.alignmentId, person)
  const practice = input.practice || alignment.practice
  requireRight(person, practice)
  const method = db.select().from(methods).where(eq(methods.id, study.methodId)).get()
  const settings: ComparisonSettings = { ...comparisonDefaults, divertWindows: method?.divertWindows ?? [], ...input.settings }
  const samples = snapshotSamples(db, alignment.id, input.sides)
  requireComparable(samples, settings)
  const sideAName = input.sideAName ?? study.sideAName
  const sideBName = input.sideBName ?? study.sideBName
  return {
    comparisonId: null, title: input.title || `${sideAName} against ${sideBName}`, practice, alignmentId: alignment.id,
    sideAName, sideBName, settings, samples: samples.map(storeSample), traces: tracesToUse(db, alignment.id, samples),
  }
}

/** Checks what a new version needs and gives the input of its job. What stands in saved versions never moves. */
export function prepareVersion(db: Database, study: VisibleStudy, comparisonId: string, input: NewVersionInput, person: Person): CompareInput {
  const comparison = findComparison(db, study.id, comparisonId, person)
  requireRight(person, comparison.practice)
  const from = findVersion(db, comparison.id, input.from)
  const fromAlignment = findVisibleAlignment(db, study.id, from.alignmentId, person)
  const alignment = findVisibleAlignment(db, study.id, input.alignmentId ?? from.alignmentId, person)
  if (alignment.practice && !comparison.practice) throw new DomainError('invalid', 'An official comparison can\'t rest on a practice alignment.')
  const kept = readSamples(from.samples)
  const samples = input.useSheet || alignment.id !== from.alignmentId
    ? snapshotSamples(db, alignment.id, { ...sidesByHand(kept), ...input.sides })
    : withSides(kept, input.sides)
  // Features are addressed by their place in an alignment: in another one they would be others.
  const settings = alignment.id === from.alignmentId ? input.settings : { ...input.settings, setAsideByHand: [] }
  requireComparable(samples, settings)
  const sideAName = input.sideAName ?? from.sideAName
  const sideBName = input.sideBName ?? from.sideBName
  const traces = tracesFrom(db, from, { alignmentId: alignment.id, samples, useTraces: input.useTraces })
  const differs = versionDifferences(
    { ...from, samples: kept, alignmentNumber: fromAlignment.number },
    { alignmentId: alignment.id, alignmentNumber: alignment.number, sideAName, sideBName, settings, samples, traces, engineVersion: ENGINE_VERSION })
  const isLatest = findVersion(db, comparison.id).number === from.number
  if (differs.length === 0 && isLatest) throw new DomainError('conflict', `Nothing differs from version ${from.number}; there is nothing to save.`)
  return {
    comparisonId: comparison.id, title: comparison.title, practice: comparison.practice, alignmentId: alignment.id,
    sideAName, sideBName, settings, samples: samples.map(storeSample), traces,
  }
}

function requireRight(person: Person, practice: boolean) {
  if (!can(person, practice ? 'practise' : 'compare')) {
    throw new DomainError('forbidden', practice ? 'Your roles do not allow practice copies.' : 'Your roles allow practice copies only. Make this one a practice copy.')
  }
}

function requireComparable(samples: ComparedSample[], settings: ComparisonSettings) {
  try {
    chooseSamples(samples, settings.normaliseByAmount)
  }
  catch (error) {
    if (error instanceof CannotCompare) throw new DomainError('invalid', error.message)
    throw error
  }
}

function sidesByHand(samples: readonly ComparedSample[]) {
  return Object.fromEntries(samples.flatMap(sample => sample.sideByHand ? [[sample.id, sample.side]] : []))
}
