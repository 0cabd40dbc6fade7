import type { ColumnSurvey } from './columnSurvey'
import type { MassKind, TimeUnit } from './layout'
import type { NamedColumn } from './tableColumns'
import type { LayoutQuestion } from './tableProposal'

const quoted = (column: NamedColumn) => `“${column.title.trim()}”`
const wanted = { mzColumn: 'm/z', minutesColumn: 'the retention time', intensityColumn: 'the intensity' }

/** Which column is it? `found` are those that could be it by their words: none or several. */
export function askColumn(field: keyof typeof wanted, found: readonly NamedColumn[], columns: readonly NamedColumn[]): LayoutQuestion {
  const numeric = columns.filter(column => column.numeric)
  const offered = found.length > 1 ? found : numeric.length > 0 ? numeric : columns
  const why = found.length > 1 ? `${found.map(quoted).join(' and ')} could each be ${wanted[field]}.` : `No column is named as ${wanted[field]}.`
  return { field, sentence: `${why} Which column holds ${wanted[field]}?`, choices: offered.map(column => ({ value: column.index, label: `column ${column.index + 1}, ${column.title.trim() || 'without a name'}` })) }
}

/** A number that can be read in two ways, and nothing in the file that tells. */
export function askMarks(surveys: readonly ColumnSurvey[]): LayoutQuestion {
  const example = surveys.find(survey => survey.example !== '')?.example ?? '12,345'
  const mark = example.includes(',') ? ',' : '.'
  const name = mark === ',' ? 'comma' : 'point'
  const digits = example.replace(/[.,]/, '')
  return {
    field: 'intensityDecimalMark',
    sentence: `Is “${example}” written with a thousands mark or with a decimal ${name}? No other intensity in the file tells.`,
    choices: [
      { value: mark === ',' ? '.' : ',', label: `a thousands mark: ${digits}` },
      { value: mark, label: `a decimal ${name}: ${example.replace(',', '.')}` },
    ],
  }
}

/** One sample or many? */
export function askShape(columns: readonly NamedColumn[]): LayoutQuestion {
  const samples = columns.filter(column => column.role === null && column.numeric).slice(0, 3).map(quoted).join(', ')
  return {
    field: 'shape',
    sentence: samples === '' ? 'No column looks like the intensities of a sample. How is this file laid out?' : `Are ${samples} … intensities of a sample each, or other values of one sample's features?`,
    choices: [{ value: 'long', label: 'one sample: a list of its features' }, { value: 'wide', label: 'a column of intensities for each sample' }],
  }
}

export function confirmTime(guess: TimeUnit, largest: number): LayoutQuestion {
  const choices = [{ value: 'seconds', label: 'seconds' }, { value: 'minutes', label: 'minutes' }]
  return {
    field: 'timeUnit',
    sentence: `The retention times look like ${guess}: they go up to ${largest}, and the file names no unit. Is that right?`,
    choices: guess === 'seconds' ? choices : choices.toReversed(),
  }
}

export function confirmKind(guess: MassKind, column: NamedColumn): LayoutQuestion {
  const choices = [{ value: 'mz', label: 'm/z of the ion' }, { value: 'neutral', label: 'mass of the neutral molecule' }]
  return {
    field: 'massKind',
    sentence: `The column ${quoted(column)} may hold neutral masses, not m/z. Which is it? (Neutral masses are aligned as such and named without adducts.)`,
    choices: guess === 'mz' ? choices : choices.toReversed(),
  }
}

export function confirmOneSample(column: NamedColumn): LayoutQuestion {
  return {
    field: 'oneSample',
    sentence: `The column ${quoted(column)} does not say the same in every row. If it names several samples, remove this file and give one list a sample, or a table with a column for each.`,
    choices: [{ value: true, label: 'all rows are of one sample' }],
  }
}
