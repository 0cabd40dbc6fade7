import type { MassKind, Measure } from './layout'

/** What a column can be. `other` is a column of the trade that is not read (charge, adduct, S/N …); `sample` names a sample in a long list. */
export type ColumnRole = 'mz' | 'minutes' | 'intensity' | 'width' | 'name' | 'sample' | 'other'

export interface RolePhrase { phrase: string, role: ColumnRole, measure?: Measure, mass?: MassKind | 'unsaid' }

const phrases = (role: ColumnRole, list: string, more: Omit<RolePhrase, 'phrase' | 'role'> = {}): RolePhrase[] =>
  list.split('|').map(phrase => ({ phrase, role, ...more }))

/** Words of the trade in English, German and French, lower case, without accents and marks. */
const all: RolePhrase[] = [
  ...phrases('mz', 'mz|mass to charge ratio|mass to charge|mass charge ratio|masse zu ladung|masse ladungs verhaltnis|rapport masse charge|masse sur charge', { mass: 'mz' }),
  ...phrases('mz', 'neutral mass|monoisotopic mass|molecular mass|molecular weight|mw|neutralmasse|monoisotopische masse|molekulmasse|molekulargewicht|masse neutre|masse moleculaire|masse monoisotopique', { mass: 'neutral' }),
  ...phrases('mz', 'mass|accurate mass|exact mass|masse|exakte masse|genaue masse|masse exacte', { mass: 'unsaid' }),
  ...phrases('minutes', 'retention time|ret time|retention|rt|r t|tr|t r|time|elution time|retentionszeit|ret zeit|zeit|temps de retention|temps retention|temps'),
  ...phrases('intensity', 'peak area|area|integrated area|area counts|integral|flache|peak flache|peakflache|aire du pic|aire|surface du pic|surface', { measure: 'area' }),
  ...phrases('intensity', 'peak height|height|apex height|apex intensity|max intensity|maximum intensity|hohe|peak hohe|peakhohe|hauteur du pic|hauteur', { measure: 'height' }),
  ...phrases('intensity', 'intensity|peak intensity|signal intensity|response|signal|abundance|counts|ion counts|ion count|intensitat|signalintensitat|haufigkeit|antwort|intensite|abondance|reponse', { measure: 'unknown' }),
  ...phrases('width', 'peak width|width|fwhm|width at half height|full width at half maximum|peak breite|peakbreite|breite|halbwertsbreite|largeur du pic|largeur a mi hauteur|largeur'),
  ...phrases('name', 'name|compound|compound name|id|feature|feature id|feature no|peak|peak no|peak id|no|nr|number|index|row|line|label|verbindung|bezeichnung|nummer|nom|compose|numero'),
  ...phrases('sample', 'sample|sample name|sample id|file|file name|filename|raw file|injection|data file|probe|probenname|datei|dateiname|echantillon|fichier|nom de l echantillon'),
  ...phrases('other', 'sn|signal to noise|snr|charge|charges|charge state|z|ladung|adduct|adducts|addukt|adduit|ion|ion species|isotope|isotopes|isotope cluster|formula|formel|formule|score|quality|qualitat|qualite|comment|comments|note|notes|kommentar'),
  ...phrases('other', 'commentaire|polarity|polaritat|polarite|mode|rank|rang|cas|inchi|inchikey|smiles|annotation|annotations|fragments|msms|ms ms|ms level|purity|resolution|symmetry|tailing|asymmetry|scan|scans|scan number|points|data points|begin|start|end|left|right|from|to'),
  ...phrases('other', 'delta|error|ppm|mda|deviation|abweichung|ecart|mad|rsd|cv|sd|std|stdev|p value|q value|pvalue|qvalue|p|q|fold change|log2 fold change|ratio|flags|flag|tags|tag|saturated|ccs|drift time|mobility|group|cluster|class|level|date|datum|volume|baseline|noise|snr|ms1|ms2|detections|detected|found|count|missing|mass defect'),
]

/** Longest first, so that "peak width" is not read as "peak". */
export const rolePhrases: readonly RolePhrase[] = all.toSorted((one, other) => other.phrase.length - one.phrase.length)

/** Words beside a role word that do not change it ("measured m/z"). */
export const fillerWords = new Set(['measured', 'observed', 'obs', 'exp', 'experimental', 'precursor', 'ion', 'mean', 'average', 'avg', 'median', 'apex', 'centroid', 'peak', 'feature', 'raw', 'total', 'integrated', 'the', 'of', 'in',
  'gemessen', 'gemessene', 'gemessenes', 'mittlere', 'mittleres', 'mittel', 'mesure', 'mesuree', 'moyen', 'moyenne', 'du', 'de', 'la', 'le', 'pic', 'corrected', 'korrigiert', 'corrige'])

/** Words that make of a role word something else ("m/z error", "RT start", "relative area"). */
export const turningWords = new Set(['error', 'delta', 'diff', 'difference', 'deviation', 'theoretical', 'theor', 'calc', 'calculated', 'expected', 'reference', 'ref', 'start', 'begin', 'end', 'left', 'right', 'lower', 'upper',
  'low', 'high', 'from', 'to', 'rsd', 'cv', 'sd', 'std', 'stdev', 'percent', 'rel', 'relative', 'ratio', 'log', 'log2', 'log10', 'ln', 'score', 'shift', 'ppm', 'mda', 'max', 'maximum', 'min', 'minimum', 'window', 'range', 'tolerance',
  'normalised', 'normalized', 'norm', 'noise', 'count', 'defect', 'index', 'predicted', 'database', 'library', 'db',
  'abweichung', 'fehler', 'berechnet', 'theoretisch', 'anfang', 'ende', 'relativ', 'relative', 'ecart', 'erreur', 'calculee', 'theorique', 'debut', 'fin', 'relatif'])
