const words = new Set(['', '-', '–', '—', '0', 'na', 'n/a', '#n/a', 'n.a.', 'n.a', 'nan', 'nd', 'n.d.', 'n.d', 'n/d', 'null', 'none', 'not detected', 'nicht detektiert', 'non detecte', 'non détecté'])

/** Whether a cell of a wide table says that nothing was detected there: empty, 0, NA, n.d., "-" and their like. */
export function isMissing(text: string): boolean {
  if (text === '' || text === '0') return true
  return text.length <= 24 && words.has(text.trim().toLowerCase())
}
