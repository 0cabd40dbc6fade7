import { SaxesParser, type SaxesTagPlain } from 'saxes'
import { MzmlRefused } from './mzmlRefused'
import { OpenSpectrum } from './openSpectrum'
import { ParamGroups, ParamList } from './params'
import { ScanCounts, type ScanPolarity } from './scanCounts'

/** One MS1 scan, as the file has it. */
export interface MzmlScan { minutes: number, mz: Float64Array, intensity: Float64Array, profile: boolean }

const DEEPEST = 64
const MOST_ATTRIBUTES = 64
/** Characters that may pass without a tag, and that an array may have in all: one of the most points in base64, and room. */
const LONGEST_STRETCH = 2 ** 25
/** Characters of an element's name: all that are open are held. */
const LONGEST_NAME = 256

/** Reads mzML as text in pieces and hands out each MS1 scan of one polarity as it ends. Holds one scan at a time. */
export class MzmlParser {
  readonly counts = new ScanCounts()
  scans = 0
  /** Scans of the polarity that don't say when they were taken: in no trace. */
  withoutTime = 0

  private readonly xml = new SaxesParser()
  private readonly path: string[] = []
  private readonly groups = new ParamGroups()
  private group: { id: string, params: ParamList } | null = null
  private spectrum: OpenSpectrum | null = null
  private array: { params: ParamList, length: string | undefined, text: string } | null = null
  private began = false
  private stretch = 0
  private attributes = 0

  constructor(private readonly polarity: ScanPolarity, private readonly onScan: (scan: MzmlScan) => void) {
    this.xml.on('doctype', () => {
      throw new MzmlRefused('This file can\'t be taken: document type declarations are not accepted. Please export it again as plain mzML.')
    })
    this.xml.on('opentagstart', () => {
      this.attributes = 0
      this.stretch = 0
    })
    this.xml.on('attribute', () => {
      if (++this.attributes > MOST_ATTRIBUTES) throw new MzmlRefused(`An element of the file has more than ${MOST_ATTRIBUTES} attributes: this is no mzML.`)
    })
    this.xml.on('opentag', tag => this.open(tag))
    this.xml.on('closetag', tag => this.close(local(tag.name)))
  }

  /** @throws MzmlRefused where the file can't be read */
  write(text: string): void {
    this.stretch += text.length
    if (this.stretch > LONGEST_STRETCH) throw new MzmlRefused('The file has a stretch of many megabytes without any tag: this is no mzML.')
    this.guard(() => this.xml.write(text))
  }

  /** @throws MzmlRefused where the file ends early, or held no scan of the polarity */
  end(): void {
    this.guard(() => this.xml.close(), true)
    if (this.scans > 0) return
    if (this.withoutTime > 0) throw new MzmlRefused('None of the file\'s scans says when it was taken, so there is no trace to draw.')
    throw new MzmlRefused(`The file has no MS1 scan in ${this.polarity} mode, which is what this study's method runs. It holds ${this.counts.words()}.`)
  }

  private guard(act: () => void, ending = false): void {
    try {
      act()
    }
    catch (error) {
      if (error instanceof MzmlRefused) throw error
      if (ending && this.path.length > 0) throw endsEarly()
      const place = error instanceof Error ? error.message.slice(0, 200) : ''
      throw new MzmlRefused(!this.began ? 'This is no mzML file: it is not even XML.' : `The file is damaged: its XML can't be read on (line and column ${place}).`)
    }
  }

  private open(tag: SaxesTagPlain): void {
    this.stretch = 0
    const name = local(tag.name)
    const parent = this.path.at(-1)
    if (parent === undefined && name !== 'mzML' && name !== 'indexedmzML') throw new MzmlRefused(`This is no mzML file: it begins with “${name.slice(0, 80)}”.`)
    if (tag.name.length > LONGEST_NAME) throw new MzmlRefused('An element of the file has a name of many hundred characters: this is no mzML.')
    if (this.path.length === DEEPEST) throw new MzmlRefused(`The file nests more than ${DEEPEST} elements: this is no mzML.`)
    this.began = true
    this.path.push(name)
    this.begin(name, parent, tag.attributes)
  }

  private begin(name: string, parent: string | undefined, attributes: Record<string, string>): void {
    if (name === 'cvParam') this.listOf(parent)?.add(attributes)
    else if (name === 'referenceableParamGroupRef') this.listOf(parent)?.addGroup(this.groups.get(attributes.ref ?? ''))
    else if (name === 'mzML') checkVersion(attributes.version)
    else if (name === 'referenceableParamGroup') this.group = { id: attributes.id ?? '', params: new ParamList() }
    else if (name === 'spectrum') this.spectrum = new OpenSpectrum(attributes)
    else if (!this.spectrum) return
    else if (name === 'scan') this.spectrum.scans++
    else if (name === 'binaryDataArrayList') this.settle(this.spectrum)
    else if (name === 'binaryDataArray' && this.spectrum.wanted) this.array = { params: new ParamList(), length: attributes.arrayLength, text: '' }
    else if (name === 'binary' && this.array) this.listen(this.array)
  }

  private close(name: string): void {
    this.stretch = 0
    this.path.pop()
    if (name === 'referenceableParamGroup' && this.group) {
      this.groups.set(this.group.id, this.group.params)
      this.group = null
    }
    else if (name === 'binary') this.xml.off('text')
    else if (name === 'binaryDataArray' && this.array) {
      this.spectrum?.takeArray(this.array.params, this.array.length, this.array.text)
      this.array = null
    }
    else if (name === 'spectrum' && this.spectrum) this.finish(this.spectrum)
  }

  /** The list that a term within this element belongs to; null where nobody asks for it. */
  private listOf(parent: string | undefined): ParamList | null {
    if (parent === 'referenceableParamGroup') return this.group?.params ?? null
    if (parent === 'binaryDataArray') return this.array?.params ?? null
    if (parent === 'spectrum') return this.spectrum?.params ?? null
    return parent === 'scan' && this.spectrum?.scans === 1 ? this.spectrum.scanParams : null
  }

  /** Text is gathered within wanted arrays alone. */
  private listen(array: { text: string }): void {
    this.xml.on('text', (text) => {
      if (array.text.length + text.length > LONGEST_STRETCH) throw new MzmlRefused('An array of the file is many megabytes long: this is no mzML.')
      array.text += text
    })
  }

  private settle(spectrum: OpenSpectrum): void {
    const { level, polarity } = spectrum
    this.counts.add(level, polarity)
    spectrum.wanted = level === 1 && polarity === this.polarity
  }

  private finish(spectrum: OpenSpectrum): void {
    this.spectrum = null
    if (spectrum.wanted === null) this.settle(spectrum)
    if (!spectrum.wanted) return
    const { minutes, profile } = spectrum
    const points = spectrum.take()
    if (minutes === null) {
      this.withoutTime++
      return
    }
    this.scans++
    this.onScan({ minutes, profile, ...points })
  }
}

const local = (name: string) => name.slice(name.indexOf(':') + 1)

const endsEarly = () => new MzmlRefused('This file can\'t be taken: the file ends early. It was cut off while it was written or copied; please export or copy it again.')

function checkVersion(version: string | undefined): void {
  if (version !== undefined && !version.startsWith('1.1')) throw new MzmlRefused(`The file is mzML ${version.slice(0, 20)}; version 1.1 is read.`)
}
