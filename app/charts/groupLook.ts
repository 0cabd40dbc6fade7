import type { Ink, MarkShape } from '~/charts/drawing'
import type { SampleGroup } from '~/charts/sampleValues'

/** How the samples of a group are marked: shape and colour say the same. */
export const groupLook: Readonly<Record<SampleGroup, { shape: MarkShape, ink: Ink }>> = {
  A: { shape: 'circle', ink: 'sideA' },
  B: { shape: 'square', ink: 'sideB' },
  blank: { shape: 'cross', ink: 'aside' },
  pooledQc: { shape: 'diamond', ink: 'muted' },
  standard: { shape: 'triangle', ink: 'muted' },
  notCompared: { shape: 'cross', ink: 'unsettled' },
}
