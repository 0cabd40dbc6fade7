/** What a key asks of the grid while no cell is being edited. */
export type GridCommand =
  | { does: 'move', rows: number, columns: number, extend: boolean }
  | { does: 'edge', row: 'first' | 'last' | 'same', column: 'first' | 'last' | 'same', extend: boolean }
  | { does: 'step', by: 1 | -1 }
  | { does: 'edit', text: string | null }
  | { does: 'clear' | 'selectAll' | 'selectRow' | 'undo' | 'leave' }

/** Rows that Page Up and Page Down go. */
const PAGE = 10

type Key = Pick<KeyboardEvent, 'key' | 'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey'>

/** Null: the key is not the grid's, and does what it does elsewhere. */
export function gridCommand({ key, shiftKey: extend, ctrlKey, metaKey, altKey }: Key): GridCommand | null {
  const control = ctrlKey || metaKey
  if (altKey) return null
  switch (key) {
    case 'ArrowUp': return control ? { does: 'edge', row: 'first', column: 'same', extend } : { does: 'move', rows: -1, columns: 0, extend }
    case 'ArrowDown': return control ? { does: 'edge', row: 'last', column: 'same', extend } : { does: 'move', rows: 1, columns: 0, extend }
    case 'ArrowLeft': return control ? { does: 'edge', row: 'same', column: 'first', extend } : { does: 'move', rows: 0, columns: -1, extend }
    case 'ArrowRight': return control ? { does: 'edge', row: 'same', column: 'last', extend } : { does: 'move', rows: 0, columns: 1, extend }
    case 'PageUp': return { does: 'move', rows: -PAGE, columns: 0, extend }
    case 'PageDown': return { does: 'move', rows: PAGE, columns: 0, extend }
    case 'Home': return { does: 'edge', row: control ? 'first' : 'same', column: 'first', extend }
    case 'End': return { does: 'edge', row: control ? 'last' : 'same', column: 'last', extend }
    case 'Tab': return control ? null : { does: 'step', by: extend ? -1 : 1 }
    case 'Enter': case 'F2': return { does: 'edit', text: null }
    case 'Delete': case 'Backspace': return { does: 'clear' }
    case 'Escape': return { does: 'leave' }
    case ' ': if (extend) return { does: 'selectRow' }
  }
  if (control) return key.toLowerCase() === 'a' ? { does: 'selectAll' } : key.toLowerCase() === 'z' && !extend ? { does: 'undo' } : null
  // Typing replaces what stands in the cell.
  return [...key].length === 1 ? { does: 'edit', text: key } : null
}
