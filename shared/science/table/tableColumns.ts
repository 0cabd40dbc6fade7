import { holdsNumbers } from './columnSurvey'
import { type HeaderCell, plainWords, readHeaderCell, readUnit } from './headerCell'
import type { LayoutAnswers, Measure, SampleColumn, TableShape } from './layout'
import type { TableSurvey } from './tableSurvey'

/** A column with what its header and units cells say. */
export interface NamedColumn extends HeaderCell { index: number, title: string, numeric: boolean, empty: boolean, largest: number }

/** Header and units row together, column by column. */
export function nameColumns(survey: TableSurvey): NamedColumn[] {
  const words = survey.header.map(plainWords)
  return survey.header.map((title, index) => {
    const cell: HeaderCell = survey.headerLine === null ? readHeaderCell('') : readHeaderCell(title)
    const unit = readUnit(survey.units?.[index] ?? '')
    const smallest = / min$/.test(words[index] ?? '') && (cell.role === 'mz' || words.includes((words[index] ?? '').replace(/ min$/, ' max')))
    const surveyed = survey.columns[index]
    return { ...cell, role: smallest ? 'other' : cell.role, time: cell.time ?? unit.time, dalton: cell.dalton || unit.dalton, index, title,
      numeric: surveyed !== undefined && holdsNumbers(surveyed), empty: surveyed === undefined || surveyed.numbers + surveyed.texts === 0, largest: surveyed?.largestWithPoint ?? 0 }
  })
}

/** The best of some columns, or several where nothing puts one before the other. */
export function bestOf(columns: readonly NamedColumn[], worth: (column: NamedColumn) => number): NamedColumn[] {
  const least = Math.min(...columns.map(worth))
  return columns.filter(column => worth(column) === least)
}

const measureWorth: Record<Measure, number> = { area: 0, height: 1, unknown: 2 }
export const intensityWorth = (column: NamedColumn) => measureWorth[column.measure] * 2 + Math.min(column.rank, 1)
export const mzWorth = (column: NamedColumn) => (column.mass === 'mz' ? 0 : column.mass === 'unsaid' ? 10 : 20) + column.rank

/** Long or wide, and the sample columns if wide. `open` where both are possible. */
export interface ShapeGuess { shape: TableShape, samples: SampleColumn[], measure: Measure, open: boolean }

export function guessShape(columns: readonly NamedColumn[], answers: LayoutAnswers): ShapeGuess {
  const named = columns.filter(column => column.role === 'intensity' && column.rank === 2 && column.numeric)
  const plain = columns.filter(column => column.role === 'intensity' && column.rank < 2)
  const measures: Measure[] = ['area', 'height', 'unknown']
  const countOf = (measure: Measure) => named.filter(column => column.measure === measure).length
  const measure = measures.reduce((best, one) => countOf(one) > countOf(best) ? one : best)
  const ofMeasure = columns.filter(column => column.role === 'intensity' && column.rank === 2 && column.measure === measure)
  const claimed = new Set([answers.mzColumn, answers.minutesColumn, answers.widthColumn])
  const titles = new Set(columns.filter(column => column.role === null).map(column => plainWords(column.title)))
  const isBare = (column: NamedColumn) => column.title.trim() !== '' && !claimed.has(column.index)
    && (column.role === null || (column.rank === 2 && column.role !== 'intensity' && !titles.has(plainWords(column.rest))))
  const bare = columns.filter(column => isBare(column) && column.numeric)
  const allBare = columns.filter(isBare).filter(column => column.numeric || column.empty)
  const long: ShapeGuess = { shape: 'long', samples: [], measure: 'unknown', open: false }
  const chosen = answers.notSamples ?? []
  const wide = (picked: readonly NamedColumn[], names: (column: NamedColumn) => string, kind: Measure): ShapeGuess => ({
    shape: 'wide', measure: kind, open: false,
    samples: picked.filter(column => !chosen.includes(column.index)).map(column => ({ name: names(column), column: column.index, minutesColumn: ownMinutes(columns, names(column)) })),
  })
  const byName = () => named.length >= 2 ? wide(ofMeasure, column => column.rest, measure) : wide(allBare, column => column.title.trim(), 'unknown')
  if (answers.shape === 'long' || (answers.shape === undefined && answers.intensityColumn !== undefined)) return long
  if (answers.shape === 'wide') return byName()
  if (columns.every(column => column.role === null)) return long
  if (named.length >= 2) return byName()
  if (plain.length === 0 && named.length === 0 && bare.length >= 2) return byName()
  return { ...long, open: plain.length > 0 && bare.length >= 3 && bare.every(column => column.largest >= 1000) }
}

function ownMinutes(columns: readonly NamedColumn[], name: string): number | null {
  if (name === '') return null
  return columns.find(column => column.role === 'minutes' && column.rank === 2 && plainWords(column.rest) === plainWords(name))?.index ?? null
}
