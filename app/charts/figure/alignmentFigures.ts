import type { AlignmentDetail } from '#shared/types/alignment'
import { counted } from '#shared/science/numeric/numberWords'
import type { FigureContext } from '~/charts/figure/figure'
import { sameFeatureSentence, settingsLine } from '~/utils/alignmentWords'

/** What stands under the figures of an alignment. */
export function alignmentFigures(study: string, { number, settings, engineVersion, tables, groups }: Pick<AlignmentDetail, 'number' | 'settings' | 'engineVersion' | 'tables' | 'groups'>): FigureContext {
  return {
    file: [study, `alignment ${number}`],
    sides: [],
    settings: [sameFeatureSentence(settings), settingsLine(settings)],
    filter: '',
    origin: `${study}; alignment ${number} of ${counted(tables, 'table')}, ${counted(groups, 'aligned feature')}`,
    engineVersion,
    cautions: [],
  }
}
