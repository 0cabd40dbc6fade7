import { describe, expect, it } from 'vitest'
import { featuresWithFlag } from '../../../app/utils/featuresWithFlag'
import type { FlagKind } from '../../../shared/schemas/flag'
import type { FlagLine } from '../../../shared/types/flag'

const flag = (featureIndex: number, kind: FlagKind): FlagLine => ({ id: `${featureIndex} ${kind}`, featureIndex, kind, reason: 'A reason.', by: 'A person', at: '2026-01-01T00:00:00.000Z' })
const flags = new Map([[3, [flag(3, 'artefact'), flag(3, 'askAgain')]], [5, [flag(5, 'artefact')]], [8, [flag(8, 'contaminant')]]])

describe('features by their flags', () => {
  it.each([['all', [3, 5, 8]], ['flagged', [3, 5, 8]], ['artefact', [3, 5]], ['askAgain', [3]], ['ofInterest', []]] as const)('%s', (filter, features) => {
    expect([...featuresWithFlag(flags, filter)]).toEqual(features)
  })
})
