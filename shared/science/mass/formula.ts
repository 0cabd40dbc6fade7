import { ISOTOPES } from './isotopes'

/** A formula that can't be read; the message is for the person who typed it. */
export class FormulaError extends Error {}

/**
 * Reads a molecular formula such as `C16H18O9` or `C8H10(OH)2` into atoms per element.
 * Round brackets may nest; spaces are ignored. Charges and isotope labels are not part of a formula here.
 * @throws FormulaError for an empty formula, an element without masses here, or a bracket without its partner
 */
export function parseFormula(formula: string): Map<string, number> {
  const text = formula.replace(/\s+/g, '')
  if (text === '') throw new FormulaError('The formula is empty. Write it as element and count, for example C16H18O9.')
  const levels: Map<string, number>[] = [new Map()]
  const token = /([A-Z][a-z]?)(\d*)|(\()|\)(\d*)/y
  while (token.lastIndex < text.length) {
    const at = token.lastIndex
    const match = token.exec(text)
    if (!match) throw new FormulaError(`“${formula}” can't be read at “${text.slice(at, at + 4)}”. Write elements and counts only, for example C16H18O9.`)
    const [, element, count, open, repeat] = match
    const current = levels.at(-1)
    if (element && current) {
      if (!ISOTOPES[element]) throw new FormulaError(`“${formula}” holds ${element}, which has no mass here. Known elements: ${Object.keys(ISOTOPES).join(', ')}.`)
      add(current, element, count ? Number(count) : 1)
    }
    else if (open) { levels.push(new Map()) }
    else {
      const inner = levels.pop()
      const outer = levels.at(-1)
      if (!inner || !outer) throw new FormulaError(`“${formula}” closes a bracket that was never opened.`)
      for (const [name, atoms] of inner) add(outer, name, atoms * (repeat ? Number(repeat) : 1))
    }
  }
  const [atoms, unclosed] = levels
  if (!atoms || unclosed) throw new FormulaError(`“${formula}” opens a bracket that is never closed.`)
  return atoms
}

function add(atoms: Map<string, number>, element: string, count: number): void {
  atoms.set(element, (atoms.get(element) ?? 0) + count)
}

/**
 * Monoisotopic mass in u of a neutral formula: the first isotope of each element (AME2020).
 * @throws FormulaError as parseFormula
 */
export function monoisotopicMass(formula: string): number {
  let mass = 0
  for (const [element, atoms] of parseFormula(formula)) mass += atoms * (ISOTOPES[element]?.[0]?.mass ?? Number.NaN)
  return mass
}
