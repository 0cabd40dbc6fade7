import type { Polarity } from '../schemas/method'
import type { MassKind } from '../science/table/layout'
import type { ComparisonSettings } from '../science/verdict/settings'
import type { Verdict } from '../science/verdict/verdicts'
import type { ComparisonDetail } from './comparison'

/** What a guest sees of one version: nothing of other versions, of the study, or of people. */
export interface SharedComparison {
  title: string
  number: number
  createdAt: string
  sideAName: string
  sideBName: string
  counts: Record<Verdict, number>
  settings: ComparisonSettings
  samples: ComparisonDetail['version']['samples']
  engineVersion: string
  polarity: Polarity
  massKind: MassKind
  cautions: string[]
  /** Mass tolerance of its alignment, ppm. */
  alignMassPpm: number
  /** When the link ends. */
  endsAt: string
  mayExport: boolean
}
