import { describe, expect, it } from 'vitest'
import { surveyTable } from '../../../../shared/formats/delimitedText/surveyTable'
import { proposeLayout } from '../../../../shared/science/table/proposeLayout'
import { recallAnswers, rememberAnswers } from '../../../../shared/science/table/rememberAnswers'
import { fileOf } from '../../../support/readTableText'

const surveyOf = (text: string) => surveyTable(fileOf(text))

describe('files of one shape', () => {
  it('have one fingerprint, whatever their title lines and numbers', async () => {
    const one = await surveyOf('Run 1\n\nMass;Zeit;Fläche\n100,5;1,5;9\n')
    const other = await surveyOf('Mass,Zeit,Fläche\n200.5,150,"9,000"\n')
    expect(proposeLayout(other).fingerprint).toBe(proposeLayout(one).fingerprint)
  })
  it('have one where wide tables differ in their samples alone', async () => {
    const one = await surveyOf('ID,m/z,RT,A1,A2\n1,100,1,5,6\n')
    const other = await surveyOf('ID,m/z,RT,B1,B2,B3,B4\n1,100,1,5,6,7,8\n')
    expect(proposeLayout(other).fingerprint).toBe(proposeLayout(one).fingerprint)
    expect(proposeLayout(other).fingerprint).not.toBe(proposeLayout(await surveyOf('m/z,RT,Area\n100,1,5\n')).fingerprint)
  })
})

describe('an answer', () => {
  it('holds for later files of the shape', async () => {
    const remembered = rememberAnswers(await surveyOf('Mass,RT,Area,Area\n100,150,5,6\n'), { massKind: 'neutral', timeUnit: 'seconds', intensityColumn: 3 })
    const later = await surveyOf('Mass,RT,Area,Area\n300,250,7,8\n')
    const { layout, confirmations } = proposeLayout(later, recallAnswers(later, remembered), true)
    expect(layout).toMatchObject({ massKind: 'neutral', timeUnit: 'seconds', intensityColumn: 3 })
    expect(confirmations).toEqual([])
  })
  it('finds its column by name where it has moved', async () => {
    const remembered = rememberAnswers(await surveyOf('m/z,RT,A1,A2,quant mass\n100,1,5,6,100\n'), { mzColumn: 4, notSamples: [0] })
    const later = await surveyOf('m/z,RT,B1,B2,B3,quant mass\n100,1,5,6,7,100\n')
    expect(recallAnswers(later, remembered)).toEqual({ mzColumn: 5, notSamples: [0] })
  })
  it('is confirmed again where a file speaks against seconds', async () => {
    const remembered = rememberAnswers(await surveyOf('m/z,RT,Area\n100,150,5\n'), { timeUnit: 'seconds' })
    const later = await surveyOf('m/z,RT,Area\n100,14.5,5\n')
    expect(proposeLayout(later, recallAnswers(later, remembered), true).confirmations.map(one => one.field)).toEqual(['timeUnit'])
  })
  it('gives way to what a file proves of its marks', async () => {
    const remembered = rememberAnswers(await surveyOf('m/z,RT,Area\n100.5,1.5,"12,345"\n'), { intensityDecimalMark: ',' })
    const later = await surveyOf('m/z,RT,Area\n100.5,1.5,"1,012,345"\n')
    expect(proposeLayout(later, recallAnswers(later, remembered), true).layout).toMatchObject({ intensityDecimalMark: '.', intensityThousandsMark: ',' })
  })
  it('leaves out a width', async () => {
    const remembered = rememberAnswers(await surveyOf('m/z,RT,Area,Width\n100,1,5,1\n'), { widthColumn: null })
    const later = await surveyOf('m/z,RT,Area,Width\n100,1,5,1\n')
    expect(proposeLayout(later, recallAnswers(later, remembered), true).layout?.widthColumn).toBeNull()
  })
})
