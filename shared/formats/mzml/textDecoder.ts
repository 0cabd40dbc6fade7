import { MzmlRefused } from './mzmlRefused'

/** The beginning of a file, where its encoding is declared. */
export const HEAD_BYTES = 200
const KNOWN = ['utf-8', 'us-ascii', 'ascii', 'iso-8859-1', 'latin1', 'windows-1252', 'utf-16', 'utf-16le']

/** Turns a file's bytes into text, by its mark of byte order or the encoding that its first line declares. */
export function textDecoderFor(head: Uint8Array): TextDecoder {
  if (head[0] === 0x1F && head[1] === 0x8B) throw new MzmlRefused('The file is compressed as a whole. Please unpack it first, then send the mzML itself.')
  if (head[0] === 0xFF && head[1] === 0xFE) return new TextDecoder('utf-16le')
  if (head[0] === 0xFE && head[1] === 0xFF) return new TextDecoder('utf-16be')
  const declared = /^[^<]{0,8}<\?xml[^>]*encoding\s*=\s*["']([\w.:-]+)["']/.exec(String.fromCharCode(...head.subarray(0, HEAD_BYTES)))?.[1]?.toLowerCase() ?? 'utf-8'
  if (!KNOWN.includes(declared)) throw new MzmlRefused(`The file says that it is written in “${declared.slice(0, 40)}”, which is not read. UTF-8 is.`)
  return new TextDecoder(declared.startsWith('utf-16') ? 'utf-8' : declared, { fatal: declared === 'utf-8' })
}
