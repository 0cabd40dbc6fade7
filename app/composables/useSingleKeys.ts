import type { Me } from '~/composables/useMe'

/**
 * Whether letters, digits and signs act as keys of the bench: as the person's profile says; for a guest as this browser keeps it.
 * `ofGuest` is null where somebody is signed in, who changes it in the profile.
 */
export function useSingleKeys() {
  const { data } = useNuxtData<Me>('me')
  const cookie = useCookie<'off' | null>('steelyard-bench-keys', { maxAge: 31_536_000, sameSite: 'lax' })
  const person = computed(() => data.value?.person ?? null)
  const ofGuest = computed({
    get: () => person.value ? null : cookie.value !== 'off',
    set: act => cookie.value = act ? null : 'off',
  })
  return { act: computed(() => person.value?.benchKeys ?? cookie.value !== 'off'), ofGuest }
}
