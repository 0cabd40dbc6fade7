import type { InjectionKey } from 'vue'

/** A key of the bench, what it does in words, and the act. */
export interface BenchKey { key: string, says: string, act: (event: KeyboardEvent) => void }

interface BenchKeyring { add: (key: BenchKey) => () => void }
const keyring: InjectionKey<BenchKeyring> = Symbol('benchKeys')

const typing = 'input, select, textarea, [contenteditable=true], [role=dialog], [role=menu]'

/** Keys that act only while the bench has the focus and nobody is typing. Call in the bench itself. */
export function useBenchKeys(own: BenchKey[]) {
  const keys = shallowRef<BenchKey[]>(own)
  provide(keyring, {
    add: (key) => {
      keys.value = [...keys.value, key]
      return () => keys.value = keys.value.filter(each => each !== key)
    },
  })
  function onKey(event: KeyboardEvent) {
    if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return
    if (event.target instanceof Element && event.target.closest(typing)) return
    const found = keys.value.find(each => each.key === event.key)
    if (!found) return
    event.preventDefault()
    found.act(event)
  }
  // Two parts may answer to one key, where both stand by the same truth; the first acts, and help names the key once.
  const shown = computed(() => keys.value.filter((each, at) => keys.value.findIndex(other => other.key === each.key) === at))
  return { keys: shown, onKey }
}

/** For what stands inside the bench: adds a key while it is shown. Outside a bench nothing happens. */
export function useBenchKey(key: BenchKey) {
  const remove = inject(keyring, null)?.add(key)
  onScopeDispose(() => remove?.())
}
