import { FormulaError, monoisotopicMass } from '#shared/science/mass/formula'

/** A mass looked for, m/z or neutral, and how far off a feature may lie. */
export interface MassTarget { value: number, ppm: number }
/** A formula looked for by the m/z of its usual ions. */
export interface FormulaTarget { formula: string, ppm: number }

/** Between two measurements, and against theory (METHODS 1: two measurements each within 5 ppm may differ by 10). */
export const MEASURED_PPM = 10
export const THEORY_PPM = 5
const MOST_PPM = 10_000
const LONGEST_FORMULA = 60

const readPpm = (text: string) => Number(text) > 0 && Number(text) <= MOST_PPM ? Number(text) : undefined

export const writeMass = (target: MassTarget | null) => target ? `${target.value}~${target.ppm}` : ''

/** Reads "313.0715~10"; undefined where it is none. */
export function readMass(text: string): MassTarget | undefined {
  const [mass = '', ppmText = ''] = text.split('~')
  const [value, ppm] = [Number(mass), readPpm(ppmText)]
  return value > 0 && value < 1e5 && ppm ? { value, ppm } : undefined
}

export const writeFormula = (target: FormulaTarget | null) => target ? `${target.formula}~${target.ppm}` : ''

/** Reads "C21H24O10~5"; undefined where it is no formula. */
export function readFormula(text: string): FormulaTarget | undefined {
  const [formula = '', ppmText = ''] = text.split('~')
  const ppm = readPpm(ppmText)
  return ppm && typeof massOfFormula(formula) === 'number' ? { formula, ppm } : undefined
}

/** The monoisotopic mass of a formula as typed, or a sentence that says what is wrong with it. */
export function massOfFormula(formula: string): number | string {
  if (formula.length > LONGEST_FORMULA) return `A formula has at most ${LONGEST_FORMULA} signs here.`
  try {
    const mass = monoisotopicMass(formula)
    return mass > 0 && mass < 1e5 ? mass : 'The mass of this formula is out of range.'
  }
  catch (error) {
    if (error instanceof FormulaError) return error.message
    throw error
  }
}
