import { plainWords } from './headerCell'
import type { LayoutAnswers } from './layout'
import type { TableSurvey } from './tableSurvey'

const columnFields = ['mzColumn', 'minutesColumn', 'intensityColumn', 'widthColumn'] as const
type ColumnField = typeof columnFields[number]

/** Answers that hold for other files of the same shape: columns by the words of their header and which of several such they are, not by place. */
export interface RememberedAnswers {
  columns: Partial<Record<ColumnField, { words: string, occurrence: number } | null>>
  notSamples: string[]
  values: Omit<LayoutAnswers, ColumnField | 'notSamples'>
}

const wordsOf = (survey: TableSurvey) => survey.header.map(plainWords)

/** What is kept of a person's answers for later files. */
export function rememberAnswers(survey: TableSurvey, answers: LayoutAnswers): RememberedAnswers {
  const words = wordsOf(survey)
  const { mzColumn, minutesColumn, intensityColumn, widthColumn, notSamples, ...values } = answers
  const remembered: RememberedAnswers = { columns: {}, notSamples: (notSamples ?? []).map(column => words[column] ?? ''), values }
  const chosen = { mzColumn, minutesColumn, intensityColumn, widthColumn }
  for (const field of columnFields) {
    const column = chosen[field]
    if (column === undefined) continue
    const word = column === null ? undefined : words[column]
    remembered.columns[field] = word === undefined || column === null ? null : { words: word, occurrence: words.slice(0, column).filter(one => one === word).length }
  }
  return remembered
}

/** The answers for another file; a column that it does not have is left open. */
export function recallAnswers(survey: TableSurvey, remembered: RememberedAnswers): LayoutAnswers {
  const words = wordsOf(survey)
  const answers: LayoutAnswers = { ...remembered.values }
  for (const field of columnFields) {
    const column = remembered.columns[field]
    if (column === undefined) continue
    if (column === null) Object.assign(answers, { [field]: null })
    else {
      const places = words.flatMap((word, index) => word === column.words ? [index] : [])
      const place = places[column.occurrence]
      if (place !== undefined) answers[field] = place
    }
  }
  const notSamples = words.flatMap((word, index) => remembered.notSamples.includes(word) ? [index] : [])
  return notSamples.length > 0 ? { ...answers, notSamples } : answers
}
