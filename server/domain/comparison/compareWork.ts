import type { ComparisonData } from '../../../shared/formats/comparisonData'
import type { SignalWindow } from '../../../shared/science/traces/highestSignals'
import type { ComparisonSettings } from '../../../shared/science/verdict/settings'
import type { TraceToLookInto } from '../trace/files/lookIntoTrace'

/** What the worker of a comparison is given. */
export interface CompareWork extends ComparisonData {
  settings: ComparisonSettings
  /** All intensities of each table, where estimated floors are still NaN. */
  tableIntensity: Float64Array[] | null
  /** The data folder. */
  folder: string
  /** Traces without maxima yet: what is found there is given back and kept. */
  toLookInto: TraceToLookInto[]
  window: SignalWindow
}
