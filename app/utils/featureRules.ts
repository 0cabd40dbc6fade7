import { nearestIon, usualIons, type IonFit, type Masses } from '#shared/science/mass/ionFits'
import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import type { BenchView } from '~/utils/benchView'
import type { FeatureRule } from '~/utils/featureFilter'
import { parseSearch, searchRule } from '~/utils/featureSearch'
import { massOfFormula, type MassTarget } from '~/utils/massTarget'
import { RANGE_FILTERS, RANGE_NAMES } from '~/utils/rangeFilters'

export interface RuleContext {
  columns: VerdictColumns
  masses: Masses
  /** The features whose flags are asked for. */
  flagged: ReadonlySet<number>
  /** More words of a feature that a search may meet: its verdict, and its names once it has any. */
  said: (feature: number) => string
}

/** What the bench's filters ask of a feature, besides its verdict. Each filter that stands is one rule. */
export function filterRules(view: BenchView, { columns, masses, flagged, said }: RuleContext): FeatureRule[] {
  const rules: FeatureRule[] = []
  if (view.flags !== 'all') rules.push(i => flagged.has(i))
  const search = parseSearch(view.find, view.massPpm)
  if (search) rules.push(searchRule(search, columns, said))
  if (view.mzNear) rules.push(mzRule(columns, { ...view.mzNear }))
  for (const fit of ionFitsAsked(view, masses)) rules.push(i => fit.of(columns.mz[i]!) !== null)
  for (const name of RANGE_NAMES) {
    const { from, to } = view[name]
    if (from !== null || to !== null) rules.push(RANGE_FILTERS[name].rule(columns, { from, to }))
  }
  return rules
}

function mzRule({ mz }: VerdictColumns, { value, ppm }: MassTarget): FeatureRule {
  const tolerance = value * ppm * 1e-6
  return i => Math.abs(mz[i]! - value) <= tolerance
}

/** Something whose usual ions are looked for: what it is in words, and how a measured m/z fits it. */
export interface AskedIons { what: string, ppm: number, of: (mz: number) => IonFit | null }

/** The formula and the neutral mass that the filter asks for. */
export function ionFitsAsked({ formula, massNear }: Pick<BenchView, 'formula' | 'massNear'>, masses: Masses): AskedIons[] {
  const asked = (what: string, mass: number, ppm: number): AskedIons => {
    const ions = usualIons(mass, masses)
    return { what, ppm, of: mz => nearestIon(mz, ions, ppm) }
  }
  const mass = formula ? massOfFormula(formula.formula) : ''
  return [
    ...(formula && typeof mass === 'number' ? [asked(formula.formula, mass, formula.ppm)] : []),
    ...(massNear ? [asked(`M ${massNear.value}`, massNear.value, massNear.ppm)] : []),
  ]
}
