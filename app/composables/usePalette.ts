import { usePreferredDark } from '@vueuse/core'
import { dark, light } from '#shared/tokens'

/** The colours of the scheme that is shown, as values: for charts, which know no classes. */
export function usePalette() {
  const scheme = useScheme()
  const systemIsDark = usePreferredDark()
  return computed(() => scheme.value === 'dark' || (scheme.value === 'system' && systemIsDark.value) ? dark : light)
}
