/** What a key asks of the feature table. `by`: rows, pages, or to the first or last. */
export type TableCommand =
  | { does: 'move', by: 'row' | 'page' | 'edge', way: 1 | -1, only: boolean, extend: boolean }
  | { does: 'select' | 'pick' | 'pickAll' | 'letGo' }

/** What a key asks while one stands in the head of the table. */
export type HeadCommand =
  | { does: 'move', by: 'column' | 'edge', way: 1 | -1 }
  | { does: 'sort', further: boolean }
  | { does: 'menu' | 'leave' }

/** What counts of a keyboard event. */
interface Pressed { key: string, ctrlKey: boolean, metaKey: boolean, altKey: boolean, shiftKey: boolean }

const MOVES: Readonly<Record<string, readonly ['row' | 'page' | 'edge', 1 | -1]>> = {
  ArrowDown: ['row', 1], ArrowUp: ['row', -1], PageDown: ['page', 1], PageUp: ['page', -1], End: ['edge', 1], Home: ['edge', -1],
}

/** The command of a key on the rows; undefined: none, the key goes on to the page. */
export function tableCommand({ key, ctrlKey, metaKey, altKey, shiftKey }: Pressed): TableCommand | undefined {
  if (altKey) return undefined
  const only = ctrlKey || metaKey
  const move = MOVES[key]
  if (move) return { does: 'move', by: move[0], way: move[1], only, extend: shiftKey }
  if (key === ' ') return { does: 'pick' }
  if (only) return key.toLowerCase() === 'a' ? { does: 'pickAll' } : undefined
  if (key === 'Enter') return { does: 'select' }
  return key === 'Escape' ? { does: 'letGo' } : undefined
}

/** The command of a key in the head; undefined: none. */
export function headCommand({ key, ctrlKey, metaKey, altKey, shiftKey }: Pressed): HeadCommand | undefined {
  if ((altKey && key === 'ArrowDown') || (shiftKey && key === 'F10') || key === 'ContextMenu') return { does: 'menu' }
  if (ctrlKey || metaKey || altKey) return undefined
  switch (key) {
    case 'ArrowRight': return { does: 'move', by: 'column', way: 1 }
    case 'ArrowLeft': return { does: 'move', by: 'column', way: -1 }
    case 'End': return { does: 'move', by: 'edge', way: 1 }
    case 'Home': return { does: 'move', by: 'edge', way: -1 }
    case 'Enter': case ' ': return { does: 'sort', further: shiftKey }
    case 'ArrowDown': case 'Escape': return { does: 'leave' }
    default: return undefined
  }
}
