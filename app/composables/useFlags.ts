import type { FlagInput } from '#shared/schemas/flag'
import type { AlignmentFlags, FlagLine } from '#shared/types/flag'

interface FlagAct { sentence: string, flagIds: string[], takenBack: boolean }

/** The flags of one alignment, shared by all who ask on a page: setting, taking back, and undoing the last act. */
export function useFlags(studyId: string, alignmentId: string) {
  const url = `/api/studies/${studyId}/alignments/${alignmentId}/flags`
  const { data, refresh } = useFetch<AlignmentFlags>(url, { key: `flags-${alignmentId}`, default: () => ({ flags: [], mayFlag: false }) })
  const lastAct = useState<FlagAct | null>(`flag-act-${alignmentId}`, () => null)

  const byFeature = computed(() => {
    const map = new Map<number, FlagLine[]>()
    for (const flag of data.value.flags) map.set(flag.featureIndex, [...map.get(flag.featureIndex) ?? [], flag])
    return map
  })

  const adding = useSubmit(async (input: FlagInput) => {
    const { flagIds } = await $fetch<{ flagIds: string[] }>(url, { method: 'POST', body: input })
    await refresh()
    lastAct.value = { sentence: countOf(flagIds.length, 'set'), flagIds, takenBack: false }
    return flagIds
  })
  const changing = useSubmit(async (flagIds: string[], takenBack: boolean) => {
    await $fetch(url, { method: 'PATCH', body: { flagIds, takenBack } })
    await refresh()
    lastAct.value = { sentence: countOf(flagIds.length, takenBack ? 'taken back' : 'set again'), flagIds, takenBack }
  })
  const undo = () => lastAct.value && changing.submit(lastAct.value.flagIds, !lastAct.value.takenBack)
  return { mayFlag: computed(() => data.value.mayFlag), byFeature, lastAct, adding, changing, undo }
}

const countOf = (flags: number, what: string) => flags === 1 ? `Flag ${what}.` : `${flags} flags ${what}.`
