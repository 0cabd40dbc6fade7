import { MzmlParser, type MzmlScan } from './mzmlParser'
import { MzmlRefused } from './mzmlRefused'
import type { ScanPolarity } from './scanCounts'
import { HEAD_BYTES, textDecoderFor } from './textDecoder'

/** What was seen on the way through a file. */
export interface ReadScans {
  scans: number
  /** Scans of the polarity that don't say when they were taken: passed over. */
  withoutTime: number
}

/**
 * Reads the MS1 scans of one polarity from an mzML 1.1 file (Martens et al. 2011), one after the other, in the file's order. Chunks
 * come in, one scan goes out: neither the file nor its scans are ever held. Times come out in minutes whatever the file says;
 * points are as the file has them, so m/z may be out of order and an intensity may be any number.
 *
 * @param chunks the file's bytes, cut anywhere
 * @param polarity scans of the other are passed over, as are those of higher MS levels
 * @param onScan called for each scan
 * @param onRead told the bytes of each chunk, for progress
 * @throws MzmlRefused with a sentence where the file can't be read, or holds no scan of the polarity
 */
export async function readScans(chunks: AsyncIterable<Uint8Array>, polarity: ScanPolarity, onScan: (scan: MzmlScan) => void, onRead: (bytes: number) => void = () => {}): Promise<ReadScans> {
  const parser = new MzmlParser(polarity, onScan)
  let decoder: TextDecoder | null = null
  for await (const chunk of withHead(chunks)) {
    decoder ??= textDecoderFor(chunk)
    parser.write(decode(decoder, chunk))
    onRead(chunk.byteLength)
  }
  if (decoder) parser.write(decode(decoder))
  parser.end()
  return { scans: parser.scans, withoutTime: parser.withoutTime }
}

/** The same chunks, the first of them long enough to tell the encoding. */
async function* withHead(chunks: AsyncIterable<Uint8Array>): AsyncIterable<Uint8Array> {
  let head: Uint8Array | null = new Uint8Array(0)
  for await (const chunk of chunks) {
    if (!head) {
      yield chunk
      continue
    }
    const longer: Uint8Array = new Uint8Array(head.length + chunk.length)
    longer.set(head)
    longer.set(chunk, head.length)
    head = longer
    if (head.length < HEAD_BYTES) continue
    yield head
    head = null
  }
  if (head && head.length > 0) yield head
}

function decode(decoder: TextDecoder, chunk?: Uint8Array): string {
  try {
    return chunk ? decoder.decode(chunk, { stream: true }) : decoder.decode()
  }
  catch {
    throw new MzmlRefused('The file holds bytes that are no text in UTF-8. It was damaged on its way; please export or copy it again.')
  }
}
