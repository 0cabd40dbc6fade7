import { canFlagWork } from '../../../shared/permissions'
import type { VisibleAlignment } from '../alignment/findVisibleAlignment'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'

/** May the person set and take back flags here? Official alignments need the right; one's own practice does not. */
export function requireFlagRight(study: { archivedAt: Date | null }, alignment: VisibleAlignment, person: Person) {
  if (!canFlagWork(person, alignment)) throw new DomainError('forbidden', 'Your roles do not allow flags on official work.')
  if (study.archivedAt) throw new DomainError('conflict', 'This study is archived. Bring it back before changing it.')
}
