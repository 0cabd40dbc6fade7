import { can, type Action, type Role } from '#shared/permissions'

export interface Me {
  person: { id: string, name: string, signInName: string, roles: Role[], benchKeys: boolean } | null
  demo: boolean
  /** The laboratory still waits for its first account. */
  first: boolean
}

/** Who is signed in. One request a page load, shared by all who ask. */
export async function useMe() {
  const { data, refresh } = await useFetch<Me>('/api/me', { key: 'me' })
  const me = computed(() => data.value?.person ?? null)
  return {
    me,
    demo: computed(() => data.value?.demo ?? false),
    first: computed(() => data.value?.first ?? false),
    /** The same table the server asks; here it only decides what to show. */
    may: (action: Action) => me.value !== null && can(me.value, action),
    refresh,
  }
}

/** Asks again who is signed in, after an act that changed it. Nuxt's own refreshing by key waits until the browser is idle, which may be never. */
export function useRefreshMe() {
  const { data } = useNuxtData<Me>('me')
  return async () => {
    data.value = await $fetch<Me>('/api/me')
  }
}
