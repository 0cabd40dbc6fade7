import type { LayoutAnswers, TableLayout } from './layout'
import type { TableSurvey } from './tableSurvey'

/** What a proposal is made from, to be kept while a file waits: what was found in it and what a person, or a remembered layout, has said. */
export interface ProposalBasis { survey: TableSurvey, answers: LayoutAnswers, remembered: boolean }

/** A choice a person has; value is what goes into the answers' field. */
export interface LayoutChoice { value: string | number | boolean, label: string }

/** Something to be said by a person before a file is read. */
export interface LayoutQuestion { field: keyof LayoutAnswers, sentence: string, choices: LayoutChoice[] }

/** How a file would be read, and what a person must still say. */
export interface TableProposal {
  /** As far as it is known. */
  guess: Partial<TableLayout>
  /** The whole layout, once no question is open (confirmations may be); null before. */
  layout: TableLayout | null
  /** What the file leaves open: nothing is read without an answer. */
  questions: LayoutQuestion[]
  /** What has been guessed and must be confirmed: the first choice is the guess. */
  confirmations: LayoutQuestion[]
  /** Worth knowing, nothing to do. */
  cautions: string[]
  /** Why the file is no table at all. */
  refuse: string | null
  /** The same for all files of this shape: their header, with a star for the sample columns of a wide table. */
  fingerprint: string
}
