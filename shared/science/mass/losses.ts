import { monoisotopicMass } from './formula'

/** A neutral part that ions lose on the way through the source, and its mass in u. */
export interface NeutralLoss {
  name: string
  formula: string
  mass: number
}

const FORMULAS: Readonly<Record<string, string>> = {
  NH3: 'NH3', H2O: 'H2O', HCN: 'CHN', CO: 'CO', CH3OH: 'CH4O', CO2: 'CO2', HCOOH: 'CH2O2', CH3COOH: 'C2H4O2',
  SO3: 'SO3', HPO3: 'HPO3', H3PO4: 'H3PO4',
  pentose: 'C5H8O4', deoxyhexose: 'C6H10O4', hexose: 'C6H10O5', caffeoyl: 'C9H6O3', glucuronyl: 'C6H8O6', malonyl: 'C3H2O3', feruloyl: 'C10H8O3',
}

/** Neutral losses common in natural products and metabolites; sugars and acyl groups as the residue that leaves. */
export const NEUTRAL_LOSSES: readonly NeutralLoss[] = Object.entries(FORMULAS).map(([name, formula]) => ({ name, formula, mass: monoisotopicMass(formula) }))
