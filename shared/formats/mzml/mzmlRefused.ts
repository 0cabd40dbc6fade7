/** A file that can't be read as mzML; the message is a sentence for the person. */
export class MzmlRefused extends Error {
  override name = 'MzmlRefused'
}
