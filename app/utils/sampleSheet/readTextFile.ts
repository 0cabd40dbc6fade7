import { markedEncoding, whyNoText } from '#shared/formats/delimitedText/encoding'

/** Bytes of a text file as text: by its byte order mark, else UTF-8, else Windows-1252. Or a sentence why it is no text. */
export function readTextFile(bytes: Uint8Array): { text: string } | { sentence: string } {
  const why = whyNoText(bytes)
  if (why) return { sentence: why }
  const marked = markedEncoding(bytes)
  if (marked) return { text: new TextDecoder(marked).decode(bytes) }
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) }
  }
  catch {
    // Not UTF-8: older spreadsheets write in the system's own characters.
    return { text: new TextDecoder('windows-1252').decode(bytes) }
  }
}
