import { unpackComparisonData, type ComparisonData } from '#shared/formats/comparisonData'
import { unpackVerdicts } from '#shared/formats/verdictColumns'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'

const readBytes = (address: string, version?: number) => $fetch<ArrayBuffer>(address, { responseType: 'arrayBuffer', query: { version } })

/** The packed verdicts of a version. */
export async function loadVerdicts(address: string, version?: number): Promise<VerdictResult> {
  return unpackVerdicts(await readBytes(address, version))
}

/** The packed intensities that a version rests on. */
export async function loadComparisonData(address: string, version?: number): Promise<ComparisonData> {
  return unpackComparisonData(await readBytes(address, version))
}
