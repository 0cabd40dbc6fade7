import { describe, expect, it } from 'vitest'
import { FormulaError, monoisotopicMass, parseFormula } from '../../../shared/science/mass/formula'

describe('parseFormula', () => {
  it.each([
    ['C16H18O9', { C: 16, H: 18, O: 9 }],
    ['C2H6O', { C: 2, H: 6, O: 1 }],
    ['C6H4(OH)2', { C: 6, H: 6, O: 2 }],
    ['CH3(CH2(CH3)2)2Cl', { C: 7, H: 19, Cl: 1 }],
    [' C 6 H 12 O 6 ', { C: 6, H: 12, O: 6 }],
    ['H2', { H: 2 }],
  ])('reads %s', (formula, atoms) => {
    expect(Object.fromEntries(parseFormula(formula))).toEqual(atoms)
  })

  it.each([
    ['', 'empty'],
    ['   ', 'empty'],
    ['c6h6', 'can\'t be read at “c6h6”'],
    ['C6H6+', 'can\'t be read at “+”'],
    ['C6Xx', 'holds Xx'],
    ['C6(H6', 'never closed'],
    ['C6H6)', 'never opened'],
  ])('refuses %j with a sentence', (formula, sentence) => {
    expect(() => parseFormula(formula)).toThrow(FormulaError)
    expect(() => parseFormula(formula)).toThrow(sentence)
  })

  it('is additive', () => {
    expect(monoisotopicMass('C6H12O6')).toBeCloseTo(6 * monoisotopicMass('CH2O'), 9)
  })
})
