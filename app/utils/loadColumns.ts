import { unpackComparisonData, type ComparisonData } from '#shared/formats/comparisonData'
import { unpackExtractedTraces, unpackSampleTraces, type ExtractedTrace, type SampleTrace } from '#shared/formats/traceColumns'
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

/** The packed total and base peak of the samples of a version that have raw data. */
export async function loadTraces(address: string, version?: number): Promise<SampleTrace[]> {
  return unpackSampleTraces(await readBytes(address, version))
}

/** The packed traces of some features in the same raw data. */
export async function loadExtracted(address: string, features: readonly number[], version?: number): Promise<ExtractedTrace[]> {
  return unpackExtractedTraces(await $fetch<ArrayBuffer>(address, { responseType: 'arrayBuffer', query: { version, features: features.join('.') } }))
}
