/** The same in a line, for what is pasted elsewhere: figures and print. */
export const SCREENING_LINE = 'Screening indication only: features are told apart by accurate mass and retention time alone. Not a confirmed identification, not a concentration, not a statement of compliance; “not found” does not mean absent.'

/**
 * What a reader outside the laboratory must know of verdicts that carry no names: for shared pages and their exports.
 * @param massPpm mass tolerance of the alignment, ppm
 */
export function screeningCaution(massPpm: number): string[] {
  return [
    `Screening indication only. Features are told apart by accurate mass (within ${massPpm} ppm) and retention time alone: no standard was run for them, and isomers cannot be told apart.`,
    'It is not a confirmed identification, not a concentration and not a statement of compliance with any limit. Before any decision on safety, legality, authenticity or recall, have the sample analysed by a validated confirmatory method with a reference standard, by a laboratory accredited for that analyte and matrix. Local law and licensed practice come first.',
    '“Not found” means below what this measurement could detect, which has not been established for any compound here. It does not mean absent.',
  ]
}
