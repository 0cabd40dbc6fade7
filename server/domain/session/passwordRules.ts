import { DomainError } from '../DomainError'
import { commonPhrases, commonWords, keyWalks } from './commonPasswords'

/** A password of at most this many walks over the keys, or of one walk again and again, takes no guessing. */
const PIECES_OF_A_WALK = 3
/** A sign-in name of fewer letters stands in too many honest passwords. */
const SHORTEST_NAME = 4

const phrases = new Set<string>(commonPhrases)
const walks = keyWalks.flatMap(row => [row + row, [...row + row].reverse().join('')])
const lookalikes: Record<string, string> = { a: '[a@4]', e: '[e3]', i: '[i1!]', l: '[l1]', o: '[o0]', s: '[s$5]', t: '[t7]' }
const words = [...commonWords].sort((a, b) => b.length - a.length).map(asWritten).join('|')

/** Why this password may not be used, or null. Only what is tried first is refused; length itself is the schema's. */
export function passwordProblem(password: string, signInName: string): string | null {
  const text = password.normalize('NFKC').toLowerCase()
  if (isRepeated(text) || countWalks(text) <= PIECES_OF_A_WALK) return 'This is one pattern on the keys, and patterns are tried first. Take three or four words that have nothing to do with each other.'
  const name = signInName.normalize('NFKC').toLowerCase().split('@')[0] ?? ''
  if (name.length >= SHORTEST_NAME && isOnly(text, asWritten(name))) return 'This is little more than the sign-in name. Take three or four words that have nothing to do with each other.'
  if (phrases.has(text.replaceAll(/[^\p{L}\p{N}]/gu, '')) || isOnly(text, words)) return 'This is among the passwords that are tried first. Take three or four words that have nothing to do with each other.'
  return null
}

/** Throws the reason at the field `password`. */
export function checkPassword(password: string, signInName: string) {
  const problem = passwordProblem(password, signInName)
  if (problem) throw new DomainError('invalid', 'Please choose another password.', [{ field: 'password', sentence: problem }])
}

/** The same one to six characters again and again. */
function isRepeated(text: string): boolean {
  return [1, 2, 3, 4, 5, 6].some(length => text.startsWith(text.slice(0, length)) && text.slice(0, length).repeat(Math.ceil(text.length / length)).startsWith(text))
}

/** In how many pieces the text falls when each piece is as long a walk over the keys, or as long a row of one character, as can be. */
function countWalks(text: string): number {
  let pieces = 0
  for (let at = 0; at < text.length; pieces++) at += longestWalk(text, at)
  return pieces
}

function longestWalk(text: string, at: number): number {
  let length = 1
  while (at + length < text.length && isWalk(text.slice(at, at + length + 1))) length++
  return length
}

function isWalk(piece: string): boolean {
  return piece === piece.charAt(0).repeat(piece.length) || walks.some(walk => walk.includes(piece))
}

/** Nothing but one or two of these words, however often, with digits, signs and at most three stray letters. */
function isOnly(text: string, pattern: string): boolean {
  const found = text.match(new RegExp(pattern, 'gu')) ?? []
  const long = new Set(found.filter(word => word.length >= 4))
  const rest = text.replaceAll(new RegExp(pattern, 'gu'), '')
  return long.size >= 1 && long.size <= 2 && (rest.match(/\p{L}/gu) ?? []).length <= 3
}

/** The word as a pattern that also finds it with digits and signs in the place of letters. */
function asWritten(word: string): string {
  return [...word].map(letter => lookalikes[letter] ?? letter.replace(/[.*+?^${}()|[\]\\]/, '\\$&')).join('')
}
