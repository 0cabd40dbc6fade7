import { Buffer } from 'node:buffer'
import { deflateSync } from 'node:zlib'
import type { ScanPolarity } from './scanCounts'
import { FLOAT_32, FLOAT_64, INTENSITY_ARRAY, MS_LEVEL, MZ_ARRAY, NEGATIVE_SCAN, NO_COMPRESSION, POSITIVE_SCAN, SCAN_START_TIME, ZLIB } from './terms'

export interface WrittenScan { level: number, polarity: ScanPolarity, minutes: number | null, mz: Float64Array, intensity: Float64Array }

/** How it is written. `grouped`: terms that all scans share stand once, in parameter groups, which makes small scans half as long. */
export interface WrittenAs { zlib: boolean, mzBits: 32 | 64, intensityBits: 32 | 64, grouped: boolean }

const term = (accession: string, name: string, value: string | number = '', unit = '') => `<cvParam cvRef="MS" accession="${accession}" name="${name}" value="${value}"${unit}/>`
const unit = (accession: string, name: string) => ` unitCvRef="${accession.slice(0, 2)}" unitAccession="${accession}" unitName="${name}"`
const reference = (group: string) => `<referenceableParamGroupRef ref="${group}"/>`

/** Writes centroided scans as mzML 1.1 (Martens et al. 2011), piece by piece, so that nothing of it need be held. */
export function* writeMzml(count: number, scans: Iterable<WrittenScan>, as: WrittenAs): Generator<string> {
  const groups: Record<string, string> = { MS1negative: scanTerms(1, 'negative'), MS1positive: scanTerms(1, 'positive'), mz: arrayTerms('mz', as), intensity: arrayTerms('intensity', as) }
  const groupList = `<referenceableParamGroupList count="${Object.keys(groups).length}">${Object.entries(groups).map(([id, terms]) => `<referenceableParamGroup id="${id}">${terms}</referenceableParamGroup>`).join('')}</referenceableParamGroupList>`
  yield `<?xml version="1.0" encoding="utf-8"?>\n<mzML xmlns="http://psi.hupo.org/ms/mzml" version="1.1.0"><cvList count="2"><cv id="MS" fullName="PSI-MS" URI="https://purl.obolibrary.org/obo/ms.obo"/><cv id="UO" fullName="Unit Ontology" URI="https://purl.obolibrary.org/obo/uo.obo"/></cvList>`
    + `<fileDescription><fileContent>${term('MS:1000579', 'MS1 spectrum')}</fileContent></fileDescription>${as.grouped ? groupList : ''}<softwareList count="1"><software id="writer" version="1"/></softwareList>`
    + `<instrumentConfigurationList count="1"><instrumentConfiguration id="instrument"/></instrumentConfigurationList><dataProcessingList count="1"><dataProcessing id="written"/></dataProcessingList>`
    + `<run id="run" defaultInstrumentConfigurationRef="instrument"><spectrumList count="${count}" defaultDataProcessingRef="written">\n`
  let index = 0
  for (const scan of scans) yield spectrum(index++, scan, as)
  yield '</spectrumList></run></mzML>\n'
}

function spectrum(index: number, { level, polarity, minutes, mz, intensity }: WrittenScan, as: WrittenAs): string {
  const terms = as.grouped && level === 1 ? reference(`MS1${polarity}`) : scanTerms(level, polarity)
  const time = minutes === null ? '' : `<scanList count="1">${term('MS:1000795', 'no combination')}<scan>${term(SCAN_START_TIME, 'scan start time', minutes, unit('UO:0000031', 'minute'))}</scan></scanList>`
  const arrays = array(as.mzBits === 32 ? Float32Array.from(mz) : mz, 'mz', as) + array(as.intensityBits === 32 ? Float32Array.from(intensity) : intensity, 'intensity', as)
  return `<spectrum index="${index}" id="scan=${index + 1}" defaultArrayLength="${mz.length}">${terms}${time}<binaryDataArrayList count="2">${arrays}</binaryDataArrayList></spectrum>\n`
}

const scanTerms = (level: number, polarity: ScanPolarity) =>
  term(MS_LEVEL, 'ms level', level) + (polarity === 'negative' ? term(NEGATIVE_SCAN, 'negative scan') : term(POSITIVE_SCAN, 'positive scan')) + term('MS:1000127', 'centroid spectrum')

function array(values: Float64Array | Float32Array, kind: 'mz' | 'intensity', as: WrittenAs): string {
  const raw = Buffer.from(values.buffer, values.byteOffset, values.byteLength)
  const text = (as.zlib ? deflateSync(raw) : raw).toString('base64')
  return `<binaryDataArray encodedLength="${text.length}">${as.grouped ? reference(kind) : arrayTerms(kind, as)}<binary>${text}</binary></binaryDataArray>`
}

function arrayTerms(kind: 'mz' | 'intensity', { zlib, mzBits, intensityBits }: WrittenAs): string {
  const bits = kind === 'mz' ? mzBits : intensityBits
  return (bits === 64 ? term(FLOAT_64, '64-bit float') : term(FLOAT_32, '32-bit float')) + (zlib ? term(ZLIB, 'zlib compression') : term(NO_COMPRESSION, 'no compression'))
    + (kind === 'mz' ? term(MZ_ARRAY, 'm/z array', '', unit('MS:1000040', 'm/z')) : term(INTENSITY_ARRAY, 'intensity array', '', unit('MS:1000131', 'number of detector counts')))
}
