export type Scheme = 'system' | 'light' | 'dark'

/** Light, dark or as the system has it: a person's choice, kept in a cookie so that the first paint is right. */
export function useScheme() {
  const scheme = useCookie<Scheme>('steelyard-scheme', { default: () => 'system', maxAge: 31_536_000, sameSite: 'lax' })
  useHead({ htmlAttrs: { 'data-scheme': () => scheme.value === 'system' ? undefined : scheme.value } })
  return scheme
}
