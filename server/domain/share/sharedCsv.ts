import { screeningCaution } from '../../../shared/science/verdict/screeningCaution'
import { settingWords } from '../../../shared/science/verdict/settingWords'
import type { Database } from '../../db/open'
import { versionColumns } from '../comparison/readVersion'
import { versionCsv, type VerdictCsv } from '../comparison/versionCsv'
import { DomainError } from '../DomainError'
import type { OpenShareLink } from './openShareLink'
import { readSharedComparison } from './readSharedComparison'

/** The verdicts of a shared version as CSV, where the link allows it; its notes name no person, file or study. */
export function sharedCsv(db: Database, link: OpenShareLink): VerdictCsv {
  if (!link.allowExport) throw new DomainError('forbidden', 'This link shows the comparison but does not allow downloads. Ask the laboratory for a link that does.')
  const shared = readSharedComparison(db, link)
  const notes = [
    `Steelyard: verdicts of “${shared.title}”, version ${shared.number}, as shared`,
    ...screeningCaution(shared.alignMassPpm),
    `Side A: ${shared.sideAName}. Side B: ${shared.sideBName}. Ratios are B over A.`,
    `Saved ${shared.createdAt}. Engine version ${shared.engineVersion}.`,
    ...settingWords(shared.settings).map(([name, value]) => `${name}: ${value}`),
    ...shared.cautions.map(caution => `Caution: ${caution}`),
  ]
  return versionCsv(shared, versionColumns(db, link.versionId), notes)
}
