import type { Role } from '#shared/permissions'

/** An account as the people page shows it. */
export interface ShownPerson {
  id: string
  name: string
  signInName: string
  email: string
  roles: Role[]
  closedAt: string | null
  hasPassword: boolean
  linkUntil: string | null
}

/** The accounts of the laboratory, and the acts of a lab lead on one of them. */
export async function usePeople() {
  const refreshMe = useRefreshMe()
  const { data, error, refresh } = await useFetch<ShownPerson[]>('/api/people', { key: 'people' })
  if (error.value) throw createError({ statusCode: error.value.statusCode, message: error.value.data?.message ?? error.value.message, fatal: true })
  const people = computed(() => data.value ?? [])
  const act = async (person: ShownPerson, name: 'close' | 'reopen') => {
    await $fetch(`/api/people/${person.id}/${name}`, { method: 'POST' })
    // One may close one's own account: whoever is signed in is asked again.
    await Promise.all([refresh(), refreshMe()])
  }
  const renewLink = async (person: ShownPerson) => {
    const { link } = await $fetch<{ link: string }>(`/api/people/${person.id}/link`, { method: 'POST' })
    await refresh()
    return link
  }
  return { people, refresh, close: (person: ShownPerson) => act(person, 'close'), reopen: (person: ShownPerson) => act(person, 'reopen'), renewLink }
}
