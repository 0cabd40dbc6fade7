const SIGNS: Readonly<Record<string, string>> = { '+': '⁺', '-': '⁻', '2': '²', '3': '³' }

/** An ion type as the trade prints it: [M−H]⁻, [M+2H]²⁺. Remarks after the charge are left out. */
export function adductWords(name: string): string {
  const [, inside, charge = ''] = /^(\[[^\]]+\])([\d+-]+)/.exec(name) ?? []
  return inside === undefined ? name : inside.replaceAll('-', '−') + [...charge].map(sign => SIGNS[sign] ?? sign).join('')
}
