import type { Action } from '#shared/permissions'
import type { StudyView } from '#shared/types/study'

export interface NextStep { title: string, sentence: string, link?: { to: string, label: string } }

/** What a study waits for, in the order of the work; for those who may not do it, what is being waited for. */
export function nextStep(study: Pick<StudyView, 'id' | 'counts' | 'archivedAt'>, may: (action: Action) => boolean): NextStep {
  const { samples, tables, alignments, comparisons } = study.counts
  const base = `/studies/${study.id}`
  if (study.archivedAt) return { title: 'Nothing to do', sentence: 'This study is archived. A lab lead can bring it back.' }
  if (samples === 0) {
    return may('editStudy')
      ? { title: 'Describe the samples', sentence: 'Paste the sample sheet from your spreadsheet, or type it: what each vial is, which side it stands on, and how much was weighed and diluted.', link: { to: `${base}/samples`, label: 'Open the sample sheet' } }
      : { title: 'No samples yet', sentence: 'An analyst has to describe the samples first.' }
  }
  if (tables === 0) {
    return may('editStudy')
      ? { title: 'Drop the feature tables', sentence: 'Export one feature table for each injection and drop all files at once. Each is matched to its sample by name.', link: { to: `${base}/tables`, label: 'Add feature tables' } }
      : { title: 'No feature tables yet', sentence: `${samples === 1 ? 'One sample is' : `${samples} samples are`} described. An analyst has to add their feature tables.` }
  }
  if (alignments === 0) {
    if (tables < 2) return { title: 'One more table', sentence: 'An alignment needs at least two feature tables.', link: { to: `${base}/tables`, label: 'Go to the tables' } }
    return may('practise')
      ? { title: 'Align the tables', sentence: `Find which features of the ${tables} tables are the same.`, link: { to: `${base}/alignments`, label: 'Go to the alignments' } }
      : { title: 'Not aligned yet', sentence: `${tables} tables wait to be aligned.` }
  }
  if (comparisons === 0) {
    return may('practise')
      ? { title: 'Compare the sides', sentence: 'The tables are aligned. Weigh one side against the other.', link: { to: `${base}/comparisons`, label: 'Go to the comparisons' } }
      : { title: 'Not compared yet', sentence: 'The tables are aligned; nobody has compared the sides yet.' }
  }
  return { title: 'Read what differs', sentence: `${comparisons === 1 ? 'One comparison is' : `${comparisons} comparisons are`} there to read.`, link: { to: `${base}/comparisons`, label: 'Open the comparisons' } }
}
