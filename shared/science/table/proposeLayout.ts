import { askColumn, askMarks, confirmKind, confirmOneSample, confirmTime, askShape } from './layoutQuestions'
import { intensityMarks, positionMarks, showsDecimal, thousandsBeside } from './numberMarks'
import { bestOf, guessShape, intensityWorth, mzWorth, nameColumns, type NamedColumn } from './tableColumns'
import { shapeFingerprint } from './shapeFingerprint'
import type { LayoutAnswers, MassKind, Measure, TableLayout, TimeUnit } from './layout'
import type { TableProposal } from './tableProposal'
import type { TableSurvey } from './tableSurvey'

/** A time above this many, without a unit, is taken as seconds. */
const LONGEST_RUN_MINUTES = 100
/** Remembered seconds are confirmed again where no time reaches this. */
const SHORTEST_RUN_SECONDS = 60

/**
 * Proposes how a file is read from what the survey of it found and what a person has said. Pure: called again after each answer,
 * by the server and by the page. `remembered` says that the answers come from an earlier file of the same shape: what this file proves then holds against them.
 */
export function proposeLayout(survey: TableSurvey, answers: LayoutAnswers = {}, remembered = false): TableProposal {
  const proposal: TableProposal = { guess: {}, layout: null, questions: [], confirmations: [], cautions: [], refuse: null, fingerprint: '' }
  const columns = nameColumns(survey)
  proposal.fingerprint = shapeFingerprint(columns, guessShape(columns, {}), survey.headerLine !== null)
  if (survey.rows === 0) return { ...proposal, refuse: 'There are no rows under the header.' }
  const { encoding, delimiter, headerLine, unitsLine, header } = survey
  const guess = proposal.guess = { encoding, delimiter, headerLine, unitsLine, header } as Partial<TableLayout>

  const shape = guessShape(columns, answers)
  guess.shape = shape.shape
  guess.sampleColumns = shape.samples
  if (shape.open) proposal.questions.push(askShape(columns))
  const taken = new Set(shape.samples.flatMap(sample => [sample.column, sample.minutesColumn]))
  const free = columns.filter(column => !taken.has(column.index))

  const pick = (field: 'mzColumn' | 'minutesColumn' | 'intensityColumn', worth: (column: NamedColumn) => number): NamedColumn | undefined => {
    const role = field === 'mzColumn' ? 'mz' : field === 'minutesColumn' ? 'minutes' : 'intensity'
    const answer = answers[field]
    const found = typeof answer === 'number' ? columns.filter(column => column.index === answer) : bestOf(free.filter(column => column.role === role && (column.rank < 2 || (role === 'intensity' && shape.shape === 'long'))), worth)
    if (found.length === 1) return found[0]
    proposal.questions.push(askColumn(field, found, columns))
    return undefined
  }
  const mz = pick('mzColumn', mzWorth)
  const ownTimes = shape.shape === 'wide' && shape.samples.length > 0 && shape.samples.every(sample => sample.minutesColumn !== null)
  const minutes = ownTimes && answers.minutesColumn === undefined ? undefined : pick('minutesColumn', column => column.rank)
  const intensity = shape.shape === 'wide' ? undefined : pick('intensityColumn', intensityWorth)
  if (minutes !== undefined) guess.sampleColumns = shape.samples.map(sample => ({ ...sample, minutesColumn: null }))
  const width = answers.widthColumn === undefined ? free.find(column => column.role === 'width' && column.rank < 2) : columns.find(column => column.index === answers.widthColumn)
  Object.assign(guess, { mzColumn: mz?.index, minutesColumn: ownTimes && minutes === undefined ? null : minutes?.index, intensityColumn: shape.shape === 'wide' ? null : intensity?.index, widthColumn: width?.index ?? null })
  if (shape.shape === 'wide' && shape.samples.length === 0) proposal.questions.push(askShape(columns))

  const timeColumns = minutes ? [minutes] : columns.filter(column => shape.samples.some(sample => sample.minutesColumn === column.index))
  const surveysOf = (some: readonly (NamedColumn | undefined)[]) => some.flatMap(column => column ? survey.columns[column.index] ?? [] : [])
  const positions = surveysOf([mz, ...timeColumns, width])
  const marks = positionMarks(positions)
  guess.decimalMark = answers.decimalMark ?? marks.decimalMark
  guess.thousandsMark = answers.thousandsMark ?? (answers.decimalMark ? thousandsBeside(positions, answers.decimalMark) : marks.thousandsMark)

  const intensityColumns = shape.shape === 'wide' ? columns.filter(column => shape.samples.some(sample => sample.column === column.index)) : [intensity]
  const values = surveysOf(intensityColumns)
  const proven = intensityMarks(values, showsDecimal(positions) ? guess.decimalMark : null)
  const said = answers.intensityDecimalMark
  if (said !== undefined && !(remembered && proven !== null)) {
    guess.intensityDecimalMark = said
    guess.intensityThousandsMark = answers.intensityThousandsMark ?? thousandsBeside(values, said)
  }
  else if (proven !== null) Object.assign(guess, { intensityDecimalMark: proven.decimalMark, intensityThousandsMark: answers.intensityThousandsMark ?? proven.thousandsMark })
  else proposal.questions.push(askMarks(values))

  const largest = Math.max(0, ...surveysOf(timeColumns).map(one => guess.decimalMark === ',' ? one.largestWithComma : one.largestWithPoint))
  guess.timeUnit = settleTime(proposal, timeColumns.find(column => column.time !== null)?.time ?? null, largest, answers.timeUnit, remembered)
  guess.widthUnit = width?.time ?? guess.timeUnit
  guess.massKind = settleMass(proposal, mz, answers.massKind)
  guess.measure = settleMeasure(proposal, columns, shape.shape === 'wide' ? shape.measure : intensity?.measure ?? 'unknown', intensity, answers.measure)
  const several = shape.shape === 'long' ? columns.find(column => column.role === 'sample' && survey.columns[column.index]?.varied) : undefined
  if (several && answers.oneSample !== true) proposal.confirmations.push(confirmOneSample(several))

  if (!columns.some(column => column.numeric)) proposal.refuse = 'No column holds numbers: this is not a feature table.'
  if (proposal.questions.length === 0 && proposal.refuse === null) proposal.layout = guess as TableLayout
  return proposal
}

function settleTime(proposal: TableProposal, word: TimeUnit | null, largest: number, said: TimeUnit | undefined, remembered: boolean): TimeUnit {
  const byRange: TimeUnit = largest > LONGEST_RUN_MINUTES ? 'seconds' : 'minutes'
  if (said !== undefined) {
    if (remembered && word === null && said === 'seconds' && largest < SHORTEST_RUN_SECONDS) proposal.confirmations.push(confirmTime(said, largest))
    return said
  }
  if (word === null && byRange === 'seconds') proposal.confirmations.push(confirmTime('seconds', largest))
  if (word === 'minutes' && largest > 2 * LONGEST_RUN_MINUTES) proposal.cautions.push(`Times go up to ${largest} minutes by the file's own word.`)
  return word ?? byRange
}

function settleMass(proposal: TableProposal, mz: NamedColumn | undefined, said: MassKind | undefined): MassKind {
  if (said !== undefined || mz === undefined) return said ?? 'mz'
  const kind: MassKind = mz.mass === 'neutral' ? 'neutral' : 'mz'
  if (mz.mass === 'neutral' || mz.mass === 'unsaid' || mz.dalton) proposal.confirmations.push(confirmKind(kind, mz))
  return kind
}

function settleMeasure(proposal: TableProposal, columns: readonly NamedColumn[], found: Measure, intensity: NamedColumn | undefined, said: Measure | undefined): Measure {
  if (intensity?.measure === 'area' && columns.some(column => column.role === 'intensity' && column.rank < 2 && column.measure === 'height')) proposal.cautions.push('Both area and height are there: the area is read.')
  const measure = said ?? found
  if (measure === 'unknown') proposal.cautions.push('The file does not say whether its intensities are areas or heights.')
  return measure
}
