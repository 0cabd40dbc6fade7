import type { SheetBlock } from '#shared/formats/sampleSheet/readBlock'

/** What came of a paste, in words. */
export function pastedSentence({ rows, headed, unknown, beyond }: SheetBlock): string {
  const count = rows.length === 1 ? '1 row' : `${rows.length} rows`
  return [
    `Pasted ${count}${headed ? ', its columns taken by their names' : ''}.`,
    unknown.length > 0 ? `Not understood and left out: ${unknown.map(head => `“${head}”`).join(', ')}.` : '',
    beyond > 0 ? `${beyond === 1 ? 'One column' : `${beyond} columns`} beyond the last of the sheet left out.` : '',
  ].filter(Boolean).join(' ')
}
