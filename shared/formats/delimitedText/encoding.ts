import type { TextEncoding } from '../../science/table/layout'

/** The encoding that a byte order mark names; null without one. */
export function markedEncoding(head: Uint8Array): TextEncoding | null {
  if (head[0] === 0xFF && head[1] === 0xFE) return 'utf-16le'
  if (head[0] === 0xFE && head[1] === 0xFF) return 'utf-16be'
  return head[0] === 0xEF && head[1] === 0xBB && head[2] === 0xBF ? 'utf-8' : null
}

/** Why these first bytes of a file are no text at all, as a sentence; null where they may be. */
export function whyNoText(head: Uint8Array): string | null {
  if (head[0] === 0x50 && head[1] === 0x4B) return 'This is a spreadsheet or an archive, not a text table. Export it as CSV or tab-separated text.'
  if (head[0] === 0x1F && head[1] === 0x8B) return 'This file is compressed. Unpack it and upload the text table inside.'
  const marked = markedEncoding(head)
  if (marked === 'utf-16le' || marked === 'utf-16be') return null
  const odd = head.subarray(0, 4096).reduce((count, byte) => count + (byte < 0x20 && byte !== 0x09 && byte !== 0x0A && byte !== 0x0D && byte !== 0x0C ? 1 : 0), 0)
  return odd > 0 ? 'This is not a text table: it holds bytes that no text has.' : null
}

/** Thrown where bytes are not what the encoding says; UTF-8 without a mark is then read as Latin-1. */
export class WrongEncoding extends Error {
  override name = 'WrongEncoding'
}

/**
 * Bytes to text with every line break as "\n", chunk by chunk; a line break or a character cut in two by a chunk's edge is put together.
 * Latin-1 is read as Windows-1252, its superset in print. Throws WrongEncoding where UTF-8 is not UTF-8.
 */
export async function* decodeText(chunks: AsyncIterable<Uint8Array> | Iterable<Uint8Array>, encoding: TextEncoding): AsyncGenerator<string> {
  const decoder = new TextDecoder(encoding, { fatal: encoding === 'utf-8' })
  let held = ''
  const decode = (chunk: Uint8Array | null) => {
    try {
      return chunk === null ? decoder.decode() : decoder.decode(chunk, { stream: true })
    }
    catch {
      throw new WrongEncoding(`The file is not ${encoding}.`)
    }
  }
  for await (const chunk of chunks) {
    const text = held + decode(chunk)
    held = text.endsWith('\r') ? '\r' : ''
    const whole = held === '' ? text : text.slice(0, -1)
    if (whole !== '') yield whole.includes('\r') ? whole.replace(/\r\n?/g, '\n') : whole
  }
  const rest = (held + decode(null)).replace(/\r\n?/g, '\n')
  if (rest !== '') yield rest
}
