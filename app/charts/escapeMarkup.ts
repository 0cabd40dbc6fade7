const MARKUP: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;' }

/** Names are typed by people, and the drawing library's hints are markup. */
export function escapeMarkup(text: string): string {
  return text.replace(/[&<>"']/g, sign => MARKUP[sign] ?? '')
}
