import type { SideNames } from '#shared/formats/sampleSheet/readCell'
import { sidesFollowBatch, sidesFollowRunOrder } from '#shared/science/verdict/confounding'
import type { SampleInput } from '#shared/schemas/sample'

/** What in a sheet would mislead a comparison, as sentences. Only samples with a side are compared. */
export function sheetCautions(samples: readonly SampleInput[], { sideAName, sideBName }: SideNames): string[] {
  const compared = samples.filter(sample => sample.kind === 'sample' && sample.side !== null)
  const weighed = new Set(compared.filter(sample => sample.amount !== null).map(sample => sample.amountUnit))
  const cautions: string[] = []
  if (sidesFollowRunOrder(compared)) cautions.push(`The sides follow the run order: all injections of one of ${sideAName} and ${sideBName} ran before all of the other. A drift of the instrument would look like a difference of the sides.`)
  if (sidesFollowBatch(compared)) cautions.push(`The sides follow the batches: no batch holds samples of both ${sideAName} and ${sideBName}. A difference between batches would look like a difference of the sides.`)
  if (weighed.size > 1) cautions.push('Some amounts are in mg and some in mL. A comparison can’t set them against each other.')
  return cautions
}
