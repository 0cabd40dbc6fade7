import { flagKindNames, type FlagInput } from '../../../shared/schemas/flag'
import type { Database } from '../../db/open'
import { flags } from '../../db/schema'
import { record } from '../activity/record'
import type { VisibleAlignment } from '../alignment/findVisibleAlignment'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import { touchStudy } from '../study/touchStudy'

/** Sets one flag on each of the features named, with one reason; returns the ids of the flags. */
export function addFlags(db: Database, alignment: VisibleAlignment, input: FlagInput, person: Person): { flagIds: string[] } {
  const features = [...new Set(input.featureIndexes)].sort((a, b) => a - b)
  const beyond = features.find(index => index >= alignment.groups)
  if (beyond !== undefined) {
    const sentence = `There is no feature ${beyond + 1} in this alignment: it has ${alignment.groups}.`
    throw new DomainError('invalid', sentence, [{ field: 'featureIndexes', sentence }])
  }
  return db.transaction((tx) => {
    const flagIds = features.map(featureIndex => tx.insert(flags).values({
      studyId: alignment.studyId, alignmentId: alignment.id, featureIndex, kind: input.kind, reason: input.reason, createdBy: person.id,
    }).returning({ id: flags.id }).get().id)
    if (!alignment.practice) touchStudy(tx, alignment.studyId)
    record(tx, { personId: person.id, action: 'flag features', studyId: alignment.studyId, subjectId: alignment.id, detail: flagDetail(alignment, features, input) })
    return { flagIds }
  })
}

const NAMED_FEATURES = 20

/** The act in words, features numbered from 1 as on the page. What is said on practice work stays with its maker. */
function flagDetail(alignment: VisibleAlignment, features: number[], { kind, reason }: FlagInput): string {
  const which = features.length > NAMED_FEATURES ? `${features.length} features` : `feature ${features.map(index => index + 1).join(', ')}`
  return alignment.practice ? `${which} of practice alignment ${alignment.number}` : `${flagKindNames[kind]}: ${which} of alignment ${alignment.number}: ${reason}`
}
