import { readTable } from '../../shared/formats/delimitedText/readTable'
import { surveyTable } from '../../shared/formats/delimitedText/surveyTable'
import type { LayoutAnswers } from '../../shared/science/table/layout'
import { proposeLayout } from '../../shared/science/table/proposeLayout'

/** A file made of text or bytes, given out in pieces of so many bytes (at most a thousand pieces). */
export function fileOf(content: string | Uint8Array, wanted = 11) {
  const bytes = typeof content === 'string' ? new TextEncoder().encode(content) : content
  const size = Math.max(wanted, Math.ceil(bytes.length / 1000))
  return async function* () {
    for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size)
  }
}

export async function proposalOf(content: string | Uint8Array, answers: LayoutAnswers = {}) {
  return proposeLayout(await surveyTable(fileOf(content)), answers)
}

/** Surveys, proposes and reads in one go; throws where a question is open. */
export async function readWhole(content: string | Uint8Array, answers: LayoutAnswers = {}) {
  const proposal = await proposalOf(content, answers)
  if (proposal.refuse !== null) throw new Error(proposal.refuse)
  if (proposal.layout === null) throw new Error(`open: ${proposal.questions.map(question => question.field).join(', ')}`)
  const built = await readTable(fileOf(content)(), proposal.layout)
  const samples = built.samples.map(({ name, emptyShare, take }) => {
    const columns = take()
    return { name, emptyShare, rows: Array.from(columns.mz, (mz, index) => [mz, columns.minutes[index], columns.intensity[index]]), width: columns.width && Array.from(columns.width), row: columns.row && Array.from(columns.row) }
  })
  return { ...built, samples, proposal, layout: proposal.layout, rows: samples[0]?.rows }
}
