import { ELECTRON_MASS } from './electron'
import { monoisotopicMass } from './formula'

export type Polarity = 'positive' | 'negative'

/** An ion type: `molecules` neutral molecules plus `shift` u, carrying `charge` elementary charges (signed). */
export interface Adduct {
  name: string
  polarity: Polarity
  molecules: number
  shift: number
  charge: number
}

/** Name, molecules, atoms gained, atoms lost, charge. */
type Row = readonly [name: string, molecules: number, gained: string, lost: string, charge: number]

const POSITIVE: readonly Row[] = [
  ['[M+H]+', 1, 'H', '', 1],
  ['[M+NH4]+', 1, 'NH4', '', 1],
  ['[M+Na]+', 1, 'Na', '', 1],
  ['[M+K]+', 1, 'K', '', 1],
  ['[M+Li]+ (7Li)', 1, 'Li', '', 1],
  ['[M+H-H2O]+', 1, 'H', 'H2O', 1],
  ['[M+H-2H2O]+', 1, 'H', 'H4O2', 1],
  ['[M+H-NH3]+', 1, 'H', 'NH3', 1],
  ['[M+CH3OH+H]+', 1, 'CH5O', '', 1],
  ['[M+ACN+H]+', 1, 'C2H4N', '', 1],
  ['[M+ACN+Na]+', 1, 'C2H3NNa', '', 1],
  ['[M+2ACN+H]+', 1, 'C4H7N2', '', 1],
  ['[M+C3H8O+H]+ (isopropanol)', 1, 'C3H9O', '', 1],
  ['[M+2Na-H]+', 1, 'Na2', 'H', 1],
  ['[M+2K-H]+', 1, 'K2', 'H', 1],
  ['[M]+. / [M]+', 1, '', '', 1],
  ['[M+2H]2+', 1, 'H2', '', 2],
  ['[M+H+Na]2+', 1, 'HNa', '', 2],
  ['[M+2Na]2+', 1, 'Na2', '', 2],
  ['[M+3H]3+', 1, 'H3', '', 3],
  ['[2M+H]+', 2, 'H', '', 1],
  ['[2M+NH4]+', 2, 'NH4', '', 1],
  ['[2M+Na]+', 2, 'Na', '', 1],
  ['[2M+K]+', 2, 'K', '', 1],
]

const NEGATIVE: readonly Row[] = [
  ['[M-H]-', 1, '', 'H', -1],
  ['[M-H2O-H]-', 1, '', 'H3O', -1],
  ['[M+Cl]- (35Cl)', 1, 'Cl', '', -1],
  ['[M+Br]- (79Br)', 1, 'Br', '', -1],
  ['[M+HCOO]- (M+FA-H)', 1, 'CHO2', '', -1],
  ['[M+CH3COO]- (M+HAc-H)', 1, 'C2H3O2', '', -1],
  ['[M+CF3COO]- (M+TFA-H)', 1, 'C2F3O2', '', -1],
  ['[M+NO3]-', 1, 'NO3', '', -1],
  ['[M+Na-2H]-', 1, 'Na', 'H2', -1],
  ['[M+K-2H]-', 1, 'K', 'H2', -1],
  ['[M]-.', 1, '', '', -1],
  ['[M-2H]2-', 1, '', 'H2', -2],
  ['[2M-H]-', 2, '', 'H', -1],
  ['[2M+HCOO]- (2M+FA-H)', 2, 'CHO2', '', -1],
  ['[2M+CH3COO]-', 2, 'C2H3O2', '', -1],
  ['[3M-H]-', 3, '', 'H', -1],
]

const massOf = (formula: string) => formula === '' ? 0 : monoisotopicMass(formula)

const adductOf = (polarity: Polarity) => ([name, molecules, gained, lost, charge]: Row): Adduct => ({
  name, polarity, molecules, charge, shift: massOf(gained) - massOf(lost) - charge * ELECTRON_MASS,
})

/** The ion types considered, commonest first in each polarity; a shift counts the electrons gained or lost. */
export const ADDUCTS: readonly Adduct[] = [...POSITIVE.map(adductOf('positive')), ...NEGATIVE.map(adductOf('negative'))]
