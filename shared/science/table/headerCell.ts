import type { MassKind, Measure, TimeUnit } from './layout'
import { type ColumnRole, fillerWords, rolePhrases, turningWords } from './columnWords'

/** What a header cell says, by words of the trade. */
export interface HeaderCell {
  role: ColumnRole | null
  /** Words left beside the role's: the name of a sample, in its own spelling ("Press A1" of "Press A1 Area"). */
  rest: string
  /** 0: the role's word alone; 1: with words that do not change it. Smaller is surer. */
  rank: number
  measure: Measure
  mass: MassKind | 'unsaid' | null
  time: TimeUnit | null
  dalton: boolean
}

const timeUnits: Record<string, TimeUnit> = { min: 'minutes', mins: 'minutes', minute: 'minutes', minutes: 'minutes', minuten: 'minutes', s: 'seconds', sec: 'seconds', secs: 'seconds', second: 'seconds', seconds: 'seconds', sek: 'seconds', sekunden: 'seconds', seconde: 'seconds', secondes: 'seconds' }
const otherUnits = new Set(['da', 'dalton', 'u', 'amu', 'th', 'mz', 'counts', 'count', 'cps', 'au', 'a u', 'arb', 'arb units', 'counts s', 'counts min', 'ppm', 'mda', '%', 'area', 'height'])

/** Lower case without accents, guard, line breaks and marks; "m/z" becomes "mz", "S/N" "sn". */
export function plainWords(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').replaceAll('ß', 'ss')
    .replace(/([a-z])([A-Z][a-z])/g, '$1 $2').replace(/\b(RT)(min|sec)/g, '$1 $2').toLowerCase()
    .replace(/\bm\s*\/\s*z\b/g, 'mz').replace(/\bs\s*\/\s*n\b/g, 'sn').replace(/^#\s*/, '')
    .replace(/[^\p{L}\p{N}%]+/gu, ' ').trim()
}

/** What a units cell, or the bracket after a header word, says. */
export function readUnit(text: string): { time: TimeUnit | null, dalton: boolean, isUnit: boolean } {
  const words = plainWords(text).replace(/^in /, '')
  const time = Object.hasOwn(timeUnits, words) ? timeUnits[words] ?? null : null
  return { time, dalton: ['da', 'dalton', 'u', 'amu'].includes(words), isUnit: time !== null || otherUnits.has(words) }
}

/** A longer cell is no title: looking for words in it would take as long as its length squared. */
const LONGEST_TITLE = 400
const nothing: HeaderCell = { role: null, rest: '', rank: 0, measure: 'unknown', mass: null, time: null, dalton: false }

/** Reads one header cell: its role, unit, measure, and what is left of it as a name. */
export function readHeaderCell(cell: string): HeaderCell {
  if (cell.length > LONGEST_TITLE) return nothing
  const bracket = /^(.*)[([{]([^)\]}]*)[)\]}]\s*(.*)$/s.exec(cell.trim())
  const unit = readUnit(bracket?.[2] ?? '')
  let text = bracket && unit.isUnit ? `${bracket[1] ?? ''} ${bracket[3] ?? ''}`.trim() : cell.trim()
  let { time, dalton } = unit
  const trailing = /^(.*[^\p{L}\p{N}])(\p{L}+)$/su.exec(text.replace(/(RT|rt)(min|sec)$/, '$1 $2'))
  if (!unit.isUnit && trailing?.[1] !== undefined && trailing[2] !== undefined) {
    const last = readUnit(trailing[2])
    if (last.time !== null || last.dalton) {
      ({ time, dalton } = last)
      text = trailing[1].replace(/[\s_,;:.-]+$/, '').replace(/[\s_]in$/i, '')
    }
  }
  const words = plainWords(text)
  if (words === '' || words.includes('%') || (bracket?.[2] ?? '').trim() === '%') return { ...nothing, role: words === '' ? null : 'other', time, dalton }
  for (const { phrase, role, measure, mass } of rolePhrases) {
    const rest = without(words, phrase)
    if (rest === null) continue
    const found: HeaderCell = { role, rest: '', rank: 0, measure: measure ?? 'unknown', mass: mass ?? null, time, dalton }
    if (rest.length === 0) return found
    if (role !== 'mz' && role !== 'minutes' && role !== 'intensity' && role !== 'width') continue
    if (rest.every(word => fillerWords.has(word))) return { ...found, rank: 1 }
    if (rest.every(word => turningWords.has(word) || fillerWords.has(word))) return { ...nothing, role: 'other', time, dalton }
    const name = nameBeside(text, phrase)
    if (name !== null) return { ...found, rest: name, rank: 2 }
  }
  return { ...nothing, time, dalton }
}

/** The words beside a phrase, or null where the phrase is not in them as whole words. */
function without(words: string, phrase: string): string[] | null {
  const at = ` ${words} `.indexOf(` ${phrase} `)
  if (at < 0) return null
  return `${words.slice(0, Math.max(0, at - 1))} ${words.slice(at + phrase.length)}`.split(' ').filter(word => word !== '')
}

/** A sample's name before or after a role's word at the edge of a header cell, in its own spelling; null where the word stands in the middle. */
function nameBeside(text: string, phrase: string): string | null {
  for (let at = 0; at < text.length; at++) {
    if (/[\p{L}\p{N}\p{M}]/u.test(text.charAt(at))) continue
    const before = text.slice(0, at)
    const after = text.slice(at)
    const name = plainWords(after) === phrase ? before : plainWords(before) === phrase ? after : ''
    const trimmed = name.replace(/^[\s_:;,.|/-]+|[\s_:;,.|/-]+$/g, '')
    if (trimmed !== '') return trimmed
  }
  return null
}
