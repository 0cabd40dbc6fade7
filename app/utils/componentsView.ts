import type { FeaturesPresent } from '#shared/science/components/chooseFeatures'

/** Components that can be shown. */
export const MOST_COMPONENTS = 5

/** Samples that may take part beside those of the two sides. */
export const FURTHER_GROUPS = ['pooledQc', 'standard', 'blank', 'notCompared'] as const
export type FurtherGroup = (typeof FURTHER_GROUPS)[number]

/** Components drawn across and upwards, counted from 1; never twice the same. */
export interface ComponentPair { across: number, upwards: number }

export const writePair = ({ across, upwards }: ComponentPair) => `${across}.${upwards}`

/** Reads a pair from an address, whatever a person made of it. */
export function readPair(text: string): ComponentPair | undefined {
  const [across = 0, upwards = 0] = /^\d\.\d$/.test(text) ? text.split('.').map(Number) : []
  const isShown = (component: number) => component >= 1 && component <= MOST_COMPONENTS
  return isShown(across) && isShown(upwards) && across !== upwards ? { across, upwards } : undefined
}

/** One end of the pair changed; where both would be the same, they change places. */
export function changePair(pair: ComponentPair, end: keyof ComponentPair, component: number): ComponentPair {
  const other = end === 'across' ? 'upwards' : 'across'
  return { ...pair, [end]: component, [other]: pair[other] === component ? pair[end] : pair[other] }
}

/** Features present in one side at least are "any", those present in both are "both". */
export const writePresent = (present: FeaturesPresent) => present === 'bothSides' ? 'both' : 'any'
export const readPresent = (text: string): FeaturesPresent | undefined => text === 'both' ? 'bothSides' : text === 'any' ? 'oneSide' : undefined

/** The further groups by name; without any, only the sides. */
export const writeGroups = (groups: readonly FurtherGroup[]) => FURTHER_GROUPS.filter(group => groups.includes(group)).join('.') || 'sides'
export function readGroups(text: string): FurtherGroup[] | undefined {
  const named = text.split('.')
  const groups = FURTHER_GROUPS.filter(group => named.includes(group))
  return groups.length > 0 || text === 'sides' ? groups : undefined
}
