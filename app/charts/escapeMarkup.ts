const MARKUP: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;' }

/** Text as it stands within markup, as content or as an attribute: names are typed by people, and figures and the drawing library's hints are markup. */
export function escapeMarkup(text: string): string {
  return text.replace(/[&<>"']/g, sign => MARKUP[sign] ?? '')
}
