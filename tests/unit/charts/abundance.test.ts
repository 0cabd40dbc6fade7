import { describe, expect, it } from 'vitest'
import { abundanceRows } from '../../../app/charts/abundanceRows'
import { abundanceRun, runBatches } from '../../../app/charts/abundanceRun'
import { abundanceText, factorText, runText } from '../../../app/charts/abundanceText'
import type { Drawing, DrawnShape } from '../../../app/charts/drawing'
import { asInjected, displayFactors, sampleValues } from '../../../app/charts/sampleValues'
import { sideMeans } from '../../../app/charts/sideMeans'
import type { Signal } from '../../../app/utils/benchView'
import { summariseSides } from '../../../shared/science/verdict/summariseSides'
import { blank, comparisonInput, none, onA, onB, type Written } from '../../support/comparisonInput'
import { seededRandom } from '../../support/seededRandom'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const settings = { normaliseByAmount: true, intensityLimit: null }

function drawn(written: readonly Written[], signal: Signal = 'normalised', width = 700) {
  const data = comparisonInput(written)
  const all = sampleValues(data, displayFactors(data.samples, settings), settings, 0)
  const values = signal === 'injected' ? asInjected(all) : all
  const means = sideMeans(data, settings, 0, signal)
  const input = { values, means, names, signal, width }
  return { data, values, means, rows: abundanceRows(input), run: abundanceRun(input), words: abundanceText(values, means, names), runWords: runText(values, names) }
}
const texts = ({ shapes }: Drawing) => shapes.flatMap(shape => shape.kind === 'text' ? [shape.text] : [])
const marks = ({ shapes }: Drawing) => shapes.flatMap(shape => shape.kind === 'mark' && shape.says ? [shape] : [])
const numbersOf = (shape: DrawnShape) => shape.kind === 'line' ? (shape.d.match(/NaN|Infinity|-?[\d.]+(?:e-?\d+)?/g) ?? []).map(Number) : [shape.x, shape.y]

const study = [
  onA('M1 a', [1000], { preparation: 'M1', runOrder: 3, batch: 'one' }), onA('M1 b', [1100], { preparation: 'M1', runOrder: 9, batch: 'two' }),
  onA('M2', [1500], { runOrder: 4, batch: 'one' }), onA('M3', [1300], { runOrder: 5, batch: 'one' }),
  onB('T1', [none], { runOrder: 6, batch: 'two', floor: 300, floorSource: 'estimated' }), onB('T2', [400], { runOrder: 7, batch: 'two', amount: 200 }),
  blank('B1', [none], { runOrder: 1, batch: 'one', floor: none }), { name: 'Q1', values: [900], kind: 'pooledQc', runOrder: 2, batch: 'one' } satisfies Written,
]

describe('the abundance of a feature by preparation', () => {
  const { rows, means, words, data } = drawn(study)

  it('names each preparation, joins its injections and counts them', () => {
    expect(texts(rows)).toEqual(expect.arrayContaining(['A Millrace', 'M1 (2 injections)', 'M2', 'M3', 'B Tallow Lane', 'mean of 3', 'blanks', 'pooled QCs']))
    const own = marks(rows).filter(({ says }) => says?.startsWith('M1 '))
    expect(own).toHaveLength(2)
    expect(rows.shapes.some(shape => shape.kind === 'line' && shape.d === `M${own.map(({ x, y }) => `${x} ${y}`).join('L')}`)).toBe(true)
  })

  it('has the mean of the comparison itself, and its interval by Student’s t', () => {
    const summary = summariseSides(data)
    expect(means[0]?.log2).toBeCloseTo(summary.a.mean[0] ?? 0, 12)
    // t(0.975; 2) = 4.302653 (tables of Student's t).
    const half = 4.302653 * Math.sqrt((summary.a.variance[0] ?? 0) / 3)
    expect(means[0]?.interval?.[1]).toBeCloseTo((summary.a.mean[0] ?? 0) + half, 5)
    expect(means[1]).toMatchObject({ detected: 1, interval: null })
  })

  it('draws what was not found hollow at its floor, with the word, never at 0', () => {
    const hollow = marks(rows).filter(mark => mark.hollow)
    expect(hollow.map(({ says }) => says)).toEqual(['T1: not found. Floor: 300, estimated.'])
    const floorLine = rows.shapes.find(shape => shape.kind === 'line' && shape.says === 'Floor: 300, estimated')
    expect(floorLine?.kind === 'line' && floorLine.d.startsWith(`M${hollow[0]?.x} `) && floorLine.dash).toBe('3 2')
    expect(texts(rows)).toEqual(expect.arrayContaining(['not found', 'not found, floor not known', 'hollow, at the floor: not found']))
  })

  it('gives each preparation its factor, and none as injected', () => {
    expect(texts(rows).filter(text => text.startsWith('×')).length).toBe(5)
    expect(texts(drawn(study, 'injected').rows).some(text => text.startsWith('×'))).toBe(false)
  })

  it('says means, doubt and floors in words', () => {
    expect(words).toMatch(/Millrace: mean of 3 preparations [\d.]+ × 10³, 95 % interval/)
    expect(words).toContain('Tallow Lane: one of 2 preparations shows it, so no interval.')
    expect(words).toContain('blanks not known')
    expect(drawn([onA('M1', [5000]), onB('T1', [7000])]).words).toContain('Millrace: one preparation, so no mean and no interval.')
  })

  it('does not draw a sample that is left out of the comparison as one of its side', () => {
    const { values } = drawn([onA('M1', [5000]), onA('M2', [8000], { amount: null }), onB('T1', [7000])])
    expect(values.find(({ name }) => name === 'M2')).toMatchObject({ group: 'notCompared', factor: 1, value: 8000 })
  })
})

describe('injected against normalised', () => {
  it('differ by the factor alone, floors too', () => {
    const normalised = drawn(study).values
    const injected = drawn(study, 'injected').values
    normalised.forEach((value, i) => {
      if (value.value > 0) expect(value.value).toBeCloseTo((injected[i]?.value ?? 0) * value.factor, 9)
      if (value.floor > 0) expect(value.floor).toBeCloseTo((injected[i]?.floor ?? 0) * value.factor, 9)
    })
    expect(injected.find(({ name }) => name === 'T2')?.value).toBe(400)
  })

  it('say what the factors are, and where the step is off', () => {
    const { values } = drawn(study)
    expect(factorText(values, 'normalised', settings)).toContain('factors from ×0.5 to ×1')
    expect(factorText(values, 'injected', settings)).toContain('as each table states them')
    expect(factorText(values, 'normalised', { normaliseByAmount: false })).toContain('The amount step of this comparison is off')
  })
})

describe('the abundance of a feature over the run', () => {
  const { run, values, runWords } = drawn(study)

  it('follows the run order, batches apart', () => {
    const { batches } = runBatches(values)
    expect(batches.map(({ name, runs }) => [name, runs.map(each => each.name)])).toEqual([['one', ['B1', 'Q1', 'M1 a', 'M2', 'M3']], ['two', ['T1', 'T2', 'M1 b']]])
    const across = marks(run).map(({ x }) => x)
    expect(across).toEqual([...across].sort((a, b) => a - b))
    expect(texts(run)).toEqual(expect.arrayContaining(['batch one', 'batch two', 'run order']))
    expect(runWords).toContain('8 injections in run order in 2 batches.')
  })

  it('keeps batches apart whose run order begins anew', () => {
    const again = drawn([onA('M1', [1000], { runOrder: 1, batch: 'b' }), onB('T1', [1000], { runOrder: 1, batch: 'a' }), onA('M2', [1000], { runOrder: 2, batch: 'b' })])
    expect(runBatches(again.values).batches.map(({ name, runs }) => [name, runs.length])).toEqual([['a', 1], ['b', 2]])
  })

  it('says which samples have no run order, and what to do where none has', () => {
    expect(drawn([onA('M1', [1000], { runOrder: 1 }), onB('T1', [2000])]).runWords).toContain('1 sample without a run order in the sample sheet is not drawn here: T1.')
    const bare = drawn([onA('M1', [1000]), onB('T1', [2000])])
    expect(bare.runWords).toContain('Give it in the sample sheet')
    expect(bare.run).toMatchObject({ height: 0, shapes: [] })
  })

  it('breaks the floor line where it is not known, and dashes what is estimated', () => {
    const lines = run.shapes.flatMap(shape => shape.kind === 'line' && shape.d.includes('H') && shape.ink === 'muted' && !shape.d.includes('h') ? [shape.dash ?? 'solid'] : [])
    expect(lines).toEqual(['solid', '3 2', 'solid'])
  })
})

describe('drawings of abundance', () => {
  it('never hold a coordinate that is no finite number, and stay within their width', () => {
    const { uniform: random } = seededRandom(7)
    const odd = [none, 0, -5, Infinity, 1e-300, 1e300, 1, 12345.678, 4e5, 4e5, 4.01e5]
    const pick = () => odd[Math.floor(random() * odd.length)] ?? none
    for (let round = 0; round < 300; round++) {
      const count = 1 + Math.floor(random() * 40)
      const rest = () => ({ floor: pick(), amount: 50 + random() * 100, runOrder: random() < 0.7 ? Math.floor(random() * 50) : null, batch: random() < 0.5 ? null : `b${Math.floor(random() * 3)}`, preparation: random() < 0.5 ? '' : `p${Math.floor(random() * 4)}` })
      const written = Array.from({ length: count }, (_, i): Written => {
        const kind = i < 2 ? 0 : Math.floor(random() * 4)
        const make = i % 2 === 0 ? onA : onB
        return kind === 0 ? make(`s${i}`, [pick()], rest()) : { name: `s${i}`, values: [pick()], kind: (['solventBlank', 'pooledQc', 'standard'] as const)[kind - 1] ?? 'standard', ...rest() }
      })
      if (count === 1) written.push(onB('other', [pick()]))
      for (const signal of ['normalised', 'injected'] as const) {
        const width = 260 + Math.floor(random() * 900)
        const { rows, run, words, runWords } = drawn(written, signal, width)
        for (const drawing of [rows, run]) {
          expect(drawing.shapes.flatMap(numbersOf).filter(value => !Number.isFinite(value))).toEqual([])
          for (const { x } of marks(drawing)) {
            expect(x).toBeGreaterThanOrEqual(0)
            expect(x).toBeLessThanOrEqual(width)
          }
        }
        expect([words, runWords, ...texts(rows), ...texts(run)].join(' ')).not.toMatch(/NaN|Infinity|undefined/)
      }
    }
  })
})
