export type Scheme = 'system' | 'light' | 'dark'

/** Light, dark or as the system has it: a person's choice, kept in a cookie so that the first paint is right. Without a choice there is no cookie. */
export function useScheme() {
  const cookie = useCookie<Scheme | null>('steelyard-scheme', { maxAge: 31_536_000, sameSite: 'lax' })
  const scheme = computed<Scheme>({
    get: () => cookie.value === 'light' || cookie.value === 'dark' ? cookie.value : 'system',
    set: next => cookie.value = next === 'system' ? null : next,
  })
  useHead({ htmlAttrs: { 'data-scheme': () => scheme.value === 'system' ? undefined : scheme.value } })
  return scheme
}
