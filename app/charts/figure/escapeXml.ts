const MARKUP: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;' }

/** Text as it stands within markup, as content or as an attribute; signs that XML forbids are left out. */
export function escapeXml(text: string): string {
  // eslint-disable-next-line no-control-regex
  return text.toWellFormed().replace(/[\u0000-\u0008\u000B\u000C\u000E-\u001F\uFFFE\uFFFF]/g, '').replace(/[&<>"']/g, sign => MARKUP[sign] ?? '')
}
