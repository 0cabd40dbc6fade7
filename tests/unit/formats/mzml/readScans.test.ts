import { deflateSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'
import { MzmlRefused } from '../../../../shared/formats/mzml/mzmlRefused'
import { mzmlText, writtenScan } from '../../../support/mzmlText'
import { scansOf, tracesOf } from '../../../support/readMzml'

const one = () => mzmlText([writtenScan()])
/** The base64 of the first array, replaced. */
const withFirstArray = (text: string, base64: string) => text.replace(/<binary>[^<]*<\/binary>/, `<binary>${base64}</binary>`)
const refusal = async (text: string | Uint8Array, polarity: 'negative' | 'positive' = 'negative') => {
  const error: unknown = await scansOf(text, polarity).then(() => null, (reason: unknown) => reason)
  expect(error).toBeInstanceOf(MzmlRefused)
  return error instanceof MzmlRefused ? error.message : ''
}

describe('readScans', () => {
  it.each([{ zlib: true, intensityBits: 64 }, { zlib: false, intensityBits: 32 }, { zlib: true, intensityBits: 32 }, { zlib: false, intensityBits: 64 }, { grouped: true, zlib: false }] as const)('reads back what was written: %o', async (as) => {
    const scans = [writtenScan({ minutes: 0.5, mz: [100.123456789, 150.5, 999.25], intensity: [1.5, 0, 1e6] }), writtenScan({ minutes: 0.75, mz: [], intensity: [] })]
    const read = await scansOf(mzmlText(scans, as))
    expect(read.map(scan => [scan.minutes, [...scan.mz], [...scan.intensity], scan.profile])).toEqual(scans.map(scan => [scan.minutes, [...scan.mz], [...scan.intensity], false]))
  })

  it('gives the same wherever the chunks are cut, within base64 and within a letter of several bytes', async () => {
    const text = mzmlText([writtenScan(), writtenScan({ minutes: 2, mz: [300.5], intensity: [7] })]).replace('id="writer"', 'id="Schreiber für µL – 走査"')
    const whole = await scansOf(text)
    expect(whole).toHaveLength(2)
    for (const bytes of [1, 2, 3, 7, 97, 1021]) expect(await scansOf(text, 'negative', bytes)).toEqual(whole)
  })

  it('reads text in Latin-1 and UTF-16 where the file says so', async () => {
    const text = one().replace('id="writer"', 'id="für"')
    const latin = Buffer.from(text.replace('encoding="utf-8"', 'encoding="ISO-8859-1"'), 'latin1')
    const wide = Buffer.concat([Buffer.from([0xFF, 0xFE]), Buffer.from(text.replace('utf-8', 'utf-16'), 'utf16le')])
    expect(await scansOf(latin)).toEqual(await scansOf(text))
    expect(await scansOf(wide)).toEqual(await scansOf(text))
    expect(await refusal(Buffer.from(text, 'latin1'))).toMatch(/no text in UTF-8/)
    expect(await refusal(text.replace('utf-8', 'ebcdic'))).toMatch(/“ebcdic”/)
    expect(await refusal(Buffer.from([0x1F, 0x8B, 8, 0]))).toMatch(/unpack it first/)
  })

  it('passes over other MS levels and the other polarity', async () => {
    const text = mzmlText([writtenScan(), writtenScan({ level: 2, mz: [50], intensity: [1e9] }), writtenScan({ polarity: 'positive' }), writtenScan({ minutes: 2 })])
    expect((await scansOf(text)).map(scan => scan.minutes)).toEqual([1, 2])
    expect(await scansOf(text, 'positive')).toHaveLength(1)
  })

  it('says what is there where no scan has the polarity', async () => {
    const text = mzmlText([writtenScan({ polarity: 'positive' }), writtenScan({ polarity: 'positive' }), writtenScan({ level: 2 })])
    expect(await refusal(text)).toBe('The file has no MS1 scan in negative mode, which is what this study\'s method runs. It holds 2 scans MS1 in positive mode and 1 scan MS2.')
    const bare = one().replace(/<cvParam[^>]*negative scan[^>]*>/, '')
    expect(await refusal(bare)).toMatch(/1 scan MS1 without a polarity/)
    expect(await refusal(one().replace(/<cvParam[^>]*ms level[^>]*>/, ''))).toMatch(/1 scan without an MS level/)
    expect(await refusal(mzmlText([]))).toMatch(/no scans at all/)
  })

  it('sorts scans whose times are out of order, and leaves points that are no measurement out', async () => {
    const { traces, centroids } = await tracesOf(mzmlText([
      writtenScan({ minutes: 3, mz: [300], intensity: [3] }), writtenScan({ minutes: 1, mz: [100, 101, 102, -5, Number.NaN, 103, 104], intensity: [1, Number.NaN, -4, 9, 9, 1e308, 1e308] }), writtenScan({ minutes: 2, mz: [], intensity: [] }),
    ]))
    expect([...traces.minutes]).toEqual([1, 2, 3])
    expect([...traces.total]).toEqual([1, 0, 3])
    expect([...traces.base]).toEqual([1, 0, 3])
    expect(centroids.scan[centroids.mz.indexOf(300)]).toBe(2)
  })

  it('refuses a run of which no scan says its time, or a time without a unit', async () => {
    expect(await refusal(mzmlText([writtenScan({ minutes: null })]))).toMatch(/when it was taken/)
    expect(await refusal(mzmlText([writtenScan({ minutes: 1e300 })]))).toMatch(/when it was taken/)
    expect(await refusal(one().replace(/ unitCvRef="UO"[^/]*unitName="minute"/, ''))).toMatch(/without a unit/)
    expect(await refusal(one().replace('UO:0000031', 'UO:0000033'))).toMatch(/“UO:0000033”/)
  })

  it('resolves groups, also one within another, and lets an element\'s own terms stand before them', async () => {
    const group = '<referenceableParamGroupList count="2"><referenceableParamGroup id="mode"><cvParam accession="MS:1000129" name="negative scan"/></referenceableParamGroup>'
      + '<referenceableParamGroup id="survey"><referenceableParamGroupRef ref="mode"/><cvParam accession="MS:1000511" name="ms level" value="2"/></referenceableParamGroup></referenceableParamGroupList>'
    const text = one().replace(/<cvParam[^>]*negative scan[^>]*>/, '<referenceableParamGroupRef ref="survey"/>').replace('<softwareList', `${group}<softwareList`)
    expect(await scansOf(text)).toHaveLength(1)
    expect(await refusal(one().replace(/<cvParam[^>]*negative scan[^>]*>/, '<referenceableParamGroupRef ref="none"/>'))).toMatch(/“none” that it does not have/)
  })

  it('refuses arrays that unpack to more or less than they declare', async () => {
    const bomb = deflateSync(Buffer.alloc(50_000_000)).toString('base64')
    expect(await refusal(withFirstArray(one(), bomb))).toMatch(/unpacks to far more than the 2 values/)
    expect(await refusal(withFirstArray(one(), deflateSync(Buffer.alloc(24)).toString('base64')))).toMatch(/far more/)
    expect(await refusal(withFirstArray(mzmlText([writtenScan()], { zlib: false }), 'A'.repeat(200_000)))).toMatch(/far more/)
    expect(await refusal(withFirstArray(one(), deflateSync(Buffer.alloc(8)).toString('base64')))).toMatch(/holds 1 values where 2 are declared/)
    expect(await refusal(withFirstArray(one(), 'AAAA'))).toMatch(/zlib data are damaged/)
    expect(await refusal(one().replace('defaultArrayLength="2"', 'defaultArrayLength="3000000"'))).toMatch(/3000000 points/)
    expect(await refusal(one().replace('defaultArrayLength="2"', 'defaultArrayLength="-1"'))).toMatch(/no number/)
  })

  it('names what it does not know of an array', async () => {
    expect(await refusal(one().replace('accession="MS:1000574" name="zlib compression"', 'accession="MS:1003089" name="truncation, delta prediction and zlib compression"'))).toMatch(/“truncation, delta prediction and zlib compression”/)
    expect(await refusal(one().replace('accession="MS:1000523" name="64-bit float"', 'accession="MS:1000522" name="64-bit integer"'))).toMatch(/“64-bit integer”/)
    expect(await refusal(one().replaceAll(/<cvParam[^>]*zlib compression[^>]*>/g, ''))).toMatch(/does not say how/)
    expect(await refusal(one().replace('MS:1000515', 'MS:1000786'))).toMatch(/its intensities are not there/)
  })

  it('refuses what is no mzML, or hostile', async () => {
    expect(await refusal('m/z,minutes,area\n1,2,3\n')).toMatch(/not even XML/)
    expect(await refusal('<html><body/></html>')).toMatch(/begins with “html”/)
    expect(await refusal(one().replace('version="1.1.0"', 'version="1.0.0"'))).toMatch(/mzML 1.0.0/)
    expect(await refusal(one().replace('id="run"', 'id="&x;"'))).toMatch(/XML can't be read/)
    expect(await refusal(one().replace('id="run"', Array.from({ length: 100 }, (_, i) => `a${i}="1"`).join(' ')))).toMatch(/64 attributes/)
    expect(await refusal(one().replace('<softwareList', `${'<a>'.repeat(100)}<softwareList`))).toMatch(/nests more than 64/)
    expect(await refusal(one().replace('<softwareList', `<!--${'x'.repeat(40_000_000)}--><softwareList`))).toMatch(/without any tag/)
    expect(await refusal(one().replace('<softwareList', `${'<cvParam accession="a" name="b"/>'.repeat(2000)}<softwareList`).replace('<scanList', `${'<cvParam accession="a" name="b"/>'.repeat(2000)}<scanList`))).toMatch(/more than 1000 terms/)
  })

  it('refuses what would pile up in memory: arrays in many parts, long names, long attributes', async () => {
    const part = `<binary>${'A'.repeat(8_000_000)}</binary>`
    expect(await refusal(one().replace(/<binary>[^<]*<.binary>/, part.repeat(5)))).toMatch(/many megabytes/)
    expect(await refusal(one().replace('<softwareList', `<${'a'.repeat(1000)}><softwareList`))).toMatch(/many hundred characters/)
    expect(await refusal(one().replace('id="run"', Array.from({ length: 5 }, (_, i) => `a${i}="${'x'.repeat(8_000_000)}"`).join(' ')))).toMatch(/many megabytes/)
  })

  it('refuses a file that ends early, wherever', async () => {
    const text = one()
    for (const share of [0.2, 0.5, 0.9, 0.99]) expect(await refusal(text.slice(0, Math.floor(text.length * share)))).toMatch(/the file ends early|not even XML/)
    expect(await refusal(text.slice(0, -20))).toMatch(/the file ends early/)
  })
})
