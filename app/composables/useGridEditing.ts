/** The one cell that is being edited. `quick`: begun by typing, so that arrow keys leave it again. */
export function useGridEditing(commit: (text: string) => void) {
  const text = ref<string | null>(null)
  let quick = false
  function start(from: string, byTyping: boolean) {
    text.value = from
    quick = byTyping
  }
  function end(keep: boolean) {
    const typed = text.value
    text.value = null
    if (keep && typed !== null) commit(typed)
  }
  /** How a key leaves the editor: where to go from here, or null where it stays. */
  function leavingBy(event: KeyboardEvent): { rows: number, step: -1 | 0 | 1, columns: number } | 'cancel' | null {
    if (event.isComposing) return null
    switch (event.key) {
      case 'Escape': return 'cancel'
      case 'Enter': return { rows: event.shiftKey ? -1 : 1, step: 0, columns: 0 }
      case 'Tab': return { rows: 0, step: event.shiftKey ? -1 : 1, columns: 0 }
    }
    if (!quick || event.shiftKey || event.ctrlKey || event.metaKey || event.altKey) return null
    switch (event.key) {
      case 'ArrowUp': return { rows: -1, step: 0, columns: 0 }
      case 'ArrowDown': return { rows: 1, step: 0, columns: 0 }
      case 'ArrowLeft': return { rows: 0, step: 0, columns: -1 }
      case 'ArrowRight': return { rows: 0, step: 0, columns: 1 }
      default: return null
    }
  }
  return { text, start, end, leavingBy }
}
