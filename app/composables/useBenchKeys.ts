import type { InjectionKey } from 'vue'

/** A key of the bench, what it does in words, and the act. */
export interface BenchKey { key: string, says: string, act: (event: KeyboardEvent) => void }

interface BenchKeyring { add: (key: BenchKey) => () => void }
const keyring: InjectionKey<BenchKeyring> = Symbol('benchKeys')

const typing = 'input, select, textarea, [contenteditable=true], [role=dialog], [role=menu]'

/** A letter, digit or sign by itself: what WCAG 2.1.4 lets a person put off. Arrows and Esc are none. */
export const isSingleKey = (key: string) => [...key].length === 1

/**
 * Keys that act only while the bench has the focus and nobody is typing. Call in the bench itself.
 * @param singleKeysAct whether letters, digits and signs act too
 */
export function useBenchKeys(own: BenchKey[], singleKeysAct: () => boolean = () => true) {
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
    if (isSingleKey(event.key) && !singleKeysAct()) return
    const found = keys.value.find(each => each.key === event.key)
    if (!found) return
    event.preventDefault()
    found.act(event)
  }
  return { keys, onKey }
}

/** For what stands inside the bench: adds a key while it is shown. Outside a bench nothing happens. */
export function useBenchKey(key: BenchKey) {
  const remove = inject(keyring, null)?.add(key)
  onScopeDispose(() => remove?.())
}
