import { writeMzml, type WrittenAs, type WrittenScan } from '../../shared/formats/mzml/writeMzml'

/** A scan of a small run: negative MS1 with two points, unless said. */
export function writtenScan(scan: Partial<Omit<WrittenScan, 'mz' | 'intensity'>> & { mz?: number[], intensity?: number[] } = {}): WrittenScan {
  const { mz = [100, 200], intensity = [10, 20], ...rest } = scan
  return { level: 1, polarity: 'negative', minutes: 1, ...rest, mz: Float64Array.from(mz), intensity: Float64Array.from(intensity) }
}

/** A small mzML file as text. */
export const mzmlText = (scans: WrittenScan[], as: Partial<WrittenAs> = {}): string => [...writeMzml(scans.length, scans, { zlib: true, mzBits: 64, intensityBits: 64, grouped: false, ...as })].join('')
