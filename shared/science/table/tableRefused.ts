/** A file that can't be read as a table at all. The message is a sentence for the person. */
export class TableRefused extends Error {
  override name = 'TableRefused'
}
