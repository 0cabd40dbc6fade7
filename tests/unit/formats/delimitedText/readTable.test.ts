import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { guardFormula } from '../../../../shared/formats/delimitedText/formulaGuard'
import { writeCsv } from '../../../../shared/formats/delimitedText/writeCsv'
import { proposalOf, readWhole } from '../../../support/readTableText'

const plain = 'm/z,RT (min),Area\n100.1,1.5,1000.5\n200.2,2.5,2000.5\n'
const rows = [[100.1, 1.5, 1000.5], [200.2, 2.5, 2000.5]]

describe('line breaks, encodings and quotes', () => {
  it.each([
    ['LF', plain], ['CRLF', plain.replaceAll('\n', '\r\n')], ['CR alone', plain.replaceAll('\n', '\r')], ['no last line break', plain.trimEnd()], ['blank lines between', plain.replaceAll('\n', '\n\n')],
    ['a byte order mark', `\uFEFF${plain}`], ['every cell quoted', plain.replaceAll(/[^,\n]+/g, '"$&"')], ['trailing delimiters', plain.replaceAll('\n', ',\n')], ['spaces around cells', plain.replaceAll(',', ' , ')],
    ['tabs', plain.replaceAll(',', '\t')], ['bars', plain.replaceAll(',', '|')], ['a separator hint', `sep=;\n${plain.replaceAll(',', ';')}`],
    ['title lines', `Report of run 7\nretention time, area and m/z of all\n\n${plain}`], ['a comment at the end', `${plain}# end, of file\n`], ['our own export', writeCsv(['m/z', 'RT (min)', 'Area', 'name'], rows.map(row => [...row, '=x']), ['alpha, 0.05'])],
  ])('reads the same with %s', async (_, text) => expect((await readWhole(text)).rows).toEqual(rows))

  it.each([['utf-16le', [0xFF, 0xFE], 0], ['utf-16be', [0xFE, 0xFF], 1]] as const)('reads %s', async (_, mark, low) => {
    const bytes = new Uint8Array(2 + plain.length * 2)
    bytes.set(mark)
    Array.from(plain).forEach((character, index) => bytes[2 + index * 2 + low] = character.charCodeAt(0))
    expect((await readWhole(bytes)).rows).toEqual(rows)
  })

  it('reads Latin-1, even where the only letter that shows it stands in the last line', async () => {
    const text = `Name;m/z;Zeit (min);Fläche\n${'a;100,1;1,5;1000,5\n'.repeat(300)}Säure;200,2;2,5;2000,5\n`
    const { layout, rowsRead } = await readWhole(Uint8Array.from(text, character => character.charCodeAt(0)))
    expect([layout.encoding, layout.measure, rowsRead, layout.header[3]]).toEqual(['windows-1252', 'area', 301, 'Fläche'])
  })

  it('keeps line numbers right after quoted line breaks', async () => {
    const { refused, rowsRead } = await readWhole('Name,m/z,"RT\n(min)",Area\n"two\r\nlines",100,1,5\n"a\n\nb",200,2,5\nx,bad,3,5\n')
    expect([rowsRead, refused]).toEqual([2, [{ line: 8, column: 'm/z', value: 'bad', reason: 'not a number' }]])
  })

  it('says where a quotation mark is never closed', async () => {
    await expect(readWhole('Name,m/z,RT,Area\na,100,1,5\n"b,200,2,5\nc,300,3,5\n')).rejects.toThrow('opens on line 3 is never closed')
  })

  it('refuses a line longer than any table has', async () => {
    await expect(readWhole(new TextEncoder().encode(`m/z,RT,Area\n100,1,5\n"${'x\n'.repeat(600_000)}`))).rejects.toThrow('Line 3 is longer than 1\u202F000\u202F000 characters')
  })

  it('lists a last line that was cut off', async () => {
    const { refused, rowsRead } = await readWhole('m/z,RT,Area\n100,1,5\n200,2')
    expect([rowsRead, refused]).toEqual([1, [{ line: 3, column: 'Area', value: '', reason: 'the line ends before this column' }]])
  })
})

describe('what is no table', () => {
  it.each([
    ['', 'empty'], ['\n \n', 'empty'], ['Dear colleague,\nplease find below, as agreed,\nnothing of use.\n', 'no columns of numbers'], ['m/z,RT,Area\n', 'no rows'], ['1\n2\n3\n', 'no columns of numbers'],
    ['m/z,RT,Area\n100,1,5\n200,\0,5\n', 'bytes that no text has'], ['PK\u0003\u0004rest', 'spreadsheet or an archive'],
  ])('%j', async (text, reason) => await expect(readWhole(text)).rejects.toThrow(reason))

  it('sees bytes of no text far into a file', async () => {
    await expect(readWhole(`m/z,RT,Area\n${'100,1,5\n'.repeat(20_000)}\0`)).rejects.toThrow(/after line (19|20)\d{3} /)
  })
  it('names a file none of whose rows can be used by its first', async () => {
    await expect(readWhole('m/z,RT,Area\n100,1,-5\n200,2,-6\n')).rejects.toThrow('No row can be used. Line 2, column Area: an intensity must be above 0 (“-5”)')
  })
})

describe('columns and units', () => {
  it.each([
    ['German words in another order', 'Verbindung;Fläche;Halbwertsbreite (min);Retentionszeit (min);m/z\na;1000,5;0,1;1,5;100,1\nb;2000,5;0,2;2,5;200,2\n'],
    ['French words', 'Nom;m/z;Temps de rétention (min);Aire du pic;Hauteur\na;100,1;1,5;1000,5;3,5\nb;200,2;2,5;2000,5;4,5\n'],
    ['Swiss thousands', 'm/z;RT;Area\n100.1;1.5;1\'000.5\n200.2;2.5;2’000.5\n'],
    ['seconds by word', 'm/z,RT [s],Area\n100.1,90,1000.5\n200.2,150,2000.5\n'],
    ['seconds by the units row', 'm/z,RT,Area\n,s,counts\n100.1,90,1000.5\n200.2,150,2000.5\n'],
    ['scientific notation', 'm/z;RT;Area\n100,1;1,5;1,0005E+03\n200,2;2,5;2,0005e3\n'],
    ['measured beside theoretical', 'Theoretical m/z,m/z,m/z error (ppm),RT start,RT,RT end,Area\n100.0,100.1,3,1.4,1.5,1.6,1000.5\n200.0,200.2,3,2.4,2.5,2.6,2000.5\n'],
    ['smallest and largest time', 'm/z,RT,RT min,RT max,Area\n100.1,1.5,1,2,1000.5\n200.2,2.5,2,3,2000.5\n'],
    ['total and mean lines', 'Name,m/z,RT,Area\nx,100.1,1.5,1000.5\ny,200.2,2.5,2000.5\nTotal,,,3001\nMean:,,,1500.5\n'],
  ])('%s', async (_, text) => {
    const { rows: read, refused, proposal } = await readWhole(text)
    expect([read, refused, proposal.confirmations]).toEqual([rows, [], []])
  })

  it('reads a width, in its own unit, and leaves it out where it is none', async () => {
    expect((await readWhole('m/z,RT (min),Area,Width (s)\n100,1,5,6\n200,2,5,n/a\n')).samples[0]?.width).toEqual([0.1, Number.NaN])
  })

  it('asks where two columns have the same name', async () => {
    const { questions, layout } = await proposalOf('m/z,m/z,RT,Area\n100,101,1,5\n')
    expect([layout, questions.map(one => one.field), questions[0]?.choices.map(choice => choice.value)]).toEqual([null, ['mzColumn'], [0, 1]])
    expect((await readWhole('m/z,m/z,RT,Area\n100,101,1,5\n', { mzColumn: 1 })).rows).toEqual([[101, 1, 5]])
  })

  it('asks for every column where there is no header', async () => {
    const text = '100.1,1.5,1000.5\n200.2,2.5,2000.5\n'
    expect((await proposalOf(text)).questions.map(one => one.field)).toEqual(['mzColumn', 'minutesColumn', 'intensityColumn'])
    expect((await readWhole(text, { mzColumn: 0, minutesColumn: 1, intensityColumn: 2 })).rows).toEqual(rows)
  })

  it('asks for the columns under a header without words of the trade', async () => {
    const { questions, guess } = await proposalOf('alpha;beta\n100,1;1,5\n200,2;2,5\n')
    expect([guess.header, questions.length > 0]).toEqual([['alpha', 'beta'], true])
  })

  it('confirms seconds that no word names, and neutral masses', async () => {
    const seconds = 'm/z,RT,Area\n100,90,5\n200,150,5\n'
    expect((await proposalOf(seconds)).confirmations.map(one => [one.field, one.choices[0]?.value])).toEqual([['timeUnit', 'seconds']])
    expect((await readWhole(seconds, { timeUnit: 'minutes' })).rows?.[1]).toEqual([200, 150, 5])
    const masses = 'Neutral mass,RT,Area\n100,1,5\n'
    expect((await proposalOf(masses)).confirmations.map(one => [one.field, one.choices[0]?.value])).toEqual([['massKind', 'neutral']])
    expect((await proposalOf(masses, { massKind: 'mz' })).layout?.massKind).toBe('mz')
  })

  it('confirms that a list which names several samples is of one', async () => {
    expect((await proposalOf('Sample,m/z,RT,Area\na,100,1,5\nb,200,2,5\n')).confirmations.map(one => one.field)).toEqual(['oneSample'])
    expect((await proposalOf('Sample,m/z,RT,Area\na,100,1,5\na,200,2,5\n')).confirmations).toEqual([])
  })

  it('takes area where both are there, and says so', async () => {
    const { layout, cautions } = await proposalOf('m/z,RT,Height,Area\n100,1,5,50\n')
    expect([layout?.measure, cautions]).toEqual(['area', ['Both area and height are there: the area is read.']])
  })
})

describe('numbers that two readings fit', () => {
  const text = (last: string) => `m/z,RT,Area\n100.1,1.5,"12,345"\n${'100.1,1.5,"12,345"\n'.repeat(400)}200.2,2.5,"${last}"\n`
  it('asks', async () => expect((await proposalOf(text('54,321'))).questions.map(one => [one.field, one.choices.map(choice => choice.label)])).toEqual([['intensityDecimalMark', ['a thousands mark: 12345', 'a decimal comma: 12.345']]]))
  it('reads each as answered', async () => {
    expect((await readWhole(text('54,321'), { intensityDecimalMark: '.' })).rows?.at(-1)).toEqual([200.2, 2.5, 54321])
    expect((await readWhole(text('54,321'), { intensityDecimalMark: ',' })).rows?.at(-1)).toEqual([200.2, 2.5, 54.321])
  })
  it('does not ask where the very last row tells', async () => {
    expect((await readWhole(text('1,054,321'))).rows?.[0]).toEqual([100.1, 1.5, 12345])
    expect((await readWhole(text('5,5'))).rows?.[0]).toEqual([100.1, 1.5, 12.345])
  })
})

describe('rows of a long list', () => {
  it.each([
    ['0,1,5', 'm/z', 'm/z must lie above 0 and below 100\u202F000'], ['100000,1,5', 'm/z', 'm/z must lie above 0 and below 100\u202F000'], ['1e400,1,5', 'm/z', 'too large to be a number'], ['Inf,1,5', 'm/z', 'not a number'],
    ['100,-0.5,5', 'RT', 'a retention time can\'t be negative'], ['100,,5', 'RT', 'empty'], ['100,1e300,5', 'RT', 'a retention time must lie below 100\u202F000 minutes'], ['100,1,0', 'Area', 'an intensity must be above 0'], ['100,1,-3', 'Area', 'an intensity must be above 0'], ['100,1,Infinity', 'Area', 'not a number'], ['100,1,1.7e308', 'Area', 'an intensity must lie below 1e30'],
    ['100,1', 'Area', 'the line ends before this column'], ['100,1,5,6', 'the whole line', 'the line has 4 cells, the header 3'],
  ])('%s is refused', async (row, column, reason) => {
    const { refused, rowsRead } = await readWhole(`m/z,RT,Area\n150,1,5\n${row}\n160,0,5\n`)
    expect([rowsRead, refused.map(one => [one.line, one.column, one.reason])]).toEqual([2, [[3, column, reason]]])
  })

  it('accounts for every line', async () => {
    const kind = fc.constantFrom('100.5,1.5,7', 'x,1,5', '', '# note', 'Total,,9')
    await fc.assert(fc.asyncProperty(fc.array(kind, { maxLength: 40 }), async (lines) => {
      const { rowsRead, refused, skipped } = await readWhole(`m/z,RT,Area\n1,1,1\n${lines.map(line => `${line}\n`).join('')}`)
      expect(rowsRead + refused.length + skipped.blank + skipped.comment + skipped.total).toBe(lines.length + 1)
      expect(refused.map(one => one.line)).toEqual(lines.flatMap((line, index) => line.startsWith('x') ? [index + 3] : []))
    }), { numRuns: 50 })
  })
})

describe('a wide table', () => {
  const text = 'ID,m/z,RT (min),Press A1,Carton B1,Blank\n1,100,1,5,n.d.,\n2,200,2,0,7,NA\n3,300,3,8,9,-\n'
  it('gives a table a sample that shares its rows', async () => {
    const { samples, rowsRead, refused } = await readWhole(text)
    expect(samples.map(({ name, rows: read, row, emptyShare }) => ({ name, read, row, emptyShare }))).toEqual([
      { name: 'Press A1', read: [[100, 1, 5], [300, 3, 8]], row: [0, 2], emptyShare: 1 / 3 },
      { name: 'Carton B1', read: [[200, 2, 7], [300, 3, 9]], row: [1, 2], emptyShare: 1 / 3 },
      { name: 'Blank', read: [], row: [], emptyShare: 1 },
    ])
    expect([rowsRead, refused]).toEqual([3, []])
  })
  it('refuses a cell, not its row, and a row without m/z', async () => {
    const { refused, samples } = await readWhole(`${text}4,400,4,-1,5,bad\nx,,4,1,1,1\n`)
    expect(refused.map(one => [one.line, one.column])).toEqual([[5, 'Press A1'], [5, 'Blank'], [6, 'm/z']])
    expect(samples[1]?.rows.at(-1)).toEqual([400, 4, 5])
  })
  it('leaves out a column that a person says is no sample', async () => {
    expect((await readWhole(text, { notSamples: [5] })).samples.map(sample => sample.name)).toEqual(['Press A1', 'Carton B1'])
  })
  it('takes a time course for samples, not for times', async () => {
    expect((await readWhole('m/z,RT,Time 0,Time 24\n100,1,5,6\n')).samples.map(sample => sample.name)).toEqual(['Time 0', 'Time 24'])
  })
  it('prefers areas, and finds each sample\'s own time', async () => {
    const { samples, layout } = await readWhole('m/z,A1 Height,A1 Area,A1 RT,B1 Height,B1 Area,B1 RT\n100,1,10,1.5,2,20,1.6\n')
    expect([layout.measure, samples.map(one => [one.name, one.rows])]).toEqual(['area', [['A1', [[100, 1.5, 10]]], ['B1', [[100, 1.6, 20]]]]])
  })
  it('refuses a value whose own time is missing', async () => {
    expect((await readWhole('m/z,A1 Area,A1 RT,B1 Area,B1 RT\n100,10,1.5,20,\n')).refused.map(one => [one.line, one.column, one.reason])).toEqual([[2, 'B1 RT', 'empty']])
  })
  it('asks where a list has an intensity and further columns like samples', async () => {
    const both = 'm/z,RT,Intensity,Press A1,Press A2,Press A3\n100,1,5000,5000,6000,7000\n'
    expect((await proposalOf(both)).questions.map(one => one.field)).toEqual(['shape'])
    expect((await readWhole(both, { shape: 'wide' })).samples).toHaveLength(3)
    expect((await readWhole(both, { shape: 'long' })).rows).toEqual([[100, 1, 5000]])
  })
})

it('strips the guard from header and preview', async () => {
  const { guess } = await proposalOf(`m/z,RT,Area,${guardFormula('=1')}\n100,1,5,\n`)
  expect(guess.header?.[3]).toBe('=1')
})
