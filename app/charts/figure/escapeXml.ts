import { escapeMarkup } from '~/charts/escapeMarkup'

/** Leaves out the signs that XML forbids: most control characters, and halves of signs. */
export function allowedXml(text: string): string {
  // eslint-disable-next-line no-control-regex
  return text.toWellFormed().replace(/[\u0000-\u0008\u000B\u000C\u000E-\u001F\uFFFE\uFFFF]/g, '')
}

/** Text as it stands within the markup of a figure, as content or as an attribute. */
export const escapeXml = (text: string): string => escapeMarkup(allowedXml(text))
