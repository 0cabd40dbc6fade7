import { useDocumentVisibility, useEventListener, useIntervalFn, useTimeoutFn } from '@vueuse/core'
import type { SampleRow, SampleSheet, SavedSheet } from '#shared/types/sample'
import type { SheetDraft } from '~/utils/sampleSheet/draft'
import { pendingChanges } from '~/utils/sampleSheet/pendingChanges'
import { settleFresh, settleSaved } from '~/utils/sampleSheet/settle'
import type { RowView } from '~/utils/sampleSheet/sheetRows'

const SAVE_AFTER_MS = 600
const RETRY_MS = [5000, 15_000, 30_000]
const LOOK_EVERY_MS = 15_000

/**
 * Saves the sheet by itself a moment after each change and looks for changes of others. One request at a time; when one fails,
 * what was typed stays and is tried again.
 */
export function useSheetSaving(options: {
  studyId: string
  base: Ref<SampleRow[]>
  draft: SheetDraft
  rows: Ref<RowView[]>
  names: Ref<{ sideAName: string, sideBName: string }>
  /** Called after a save by which the number of samples changed. */
  onCount: () => void
}) {
  const { base, draft, rows, names } = options
  const url = `/api/studies/${options.studyId}/samples`
  const saving = ref(false)
  const problem = ref<string | null>(null)
  let failures = 0
  const soon = useTimeoutFn(save, SAVE_AFTER_MS, { immediate: false })
  const retry = useTimeoutFn(save, () => RETRY_MS[Math.min(failures, RETRY_MS.length) - 1] ?? SAVE_AFTER_MS, { immediate: false })

  function take(fresh: SampleRow[]) {
    const before = base.value
    base.value = fresh
    settleFresh(draft, before, fresh, names.value)
  }

  async function save() {
    soon.stop()
    retry.stop()
    const sent = saving.value ? null : pendingChanges(rows.value, draft)
    if (!sent) {
      if (!saving.value) problem.value = null
      return
    }
    saving.value = true
    try {
      const saved = await $fetch<SavedSheet>(url, { method: 'PATCH', body: sent.changes })
      const count = base.value.length
      settleSaved(draft, sent, saved)
      take(saved.samples)
      failures = 0
      problem.value = null
      if (saved.samples.length !== count) options.onCount()
    }
    catch (error) {
      failures++
      problem.value = toProblem(error).message
    }
    finally {
      saving.value = false
    }
    if (problem.value) retry.start()
    else if (pendingChanges(rows.value, draft)) soon.start()
  }

  async function look() {
    if (saving.value || visibility.value !== 'visible') return
    const before = base.value
    try {
      const { samples } = await $fetch<SampleSheet>(url)
      // A save that began meanwhile knows better.
      if (!saving.value && base.value === before) take(samples)
    }
    catch {
      // Looking is a courtesy: the next save says what is wrong with the connection.
    }
  }

  const visibility = useDocumentVisibility()
  useIntervalFn(look, LOOK_EVERY_MS)
  watch(visibility, look)
  useEventListener('focus', look)
  useEventListener('online', () => problem.value && save())
  const unsaved = computed(() => saving.value || pendingChanges(rows.value, draft) !== null)
  useEventListener('beforeunload', (event) => {
    if (unsaved.value || rows.value.some(row => Object.values(row.cells).some(cell => cell.state !== 'still'))) event.preventDefault()
  })
  onScopeDispose(() => {
    if (pendingChanges(rows.value, draft)) void save()
  })

  return { saving, problem, unsaved, save, look, changed: () => { soon.start() } }
}
