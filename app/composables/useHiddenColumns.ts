import { useLocalStorage } from '@vueuse/core'
import type { FeatureColumn } from '~/utils/featureColumns'

/** The columns of the feature table that a person has put away, kept in this browser. */
export function useHiddenColumns() {
  return useLocalStorage<FeatureColumn['id'][]>('steelyard-hidden-columns', [])
}
