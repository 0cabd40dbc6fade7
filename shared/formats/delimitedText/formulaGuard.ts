/** A cell that a spreadsheet would run as a formula, with any apostrophes already before it. */
const formula = /^'*[=+\-@\t\r]/
const guarded = /^'+[=+\-@\t\r]/

/**
 * Puts an apostrophe before text that a spreadsheet would take for a formula (= + - @ tab CR), so that an exported name
 * can't run anything on the reader's machine. Text that begins with a guard already gets another: stripping gives it back.
 */
export function guardFormula(text: string): string {
  return formula.test(text) ? `'${text}` : text
}

/** Takes away the apostrophe that guardFormula put there; other text is left as it is. */
export function stripFormulaGuard(text: string): string {
  return guarded.test(text) ? text.slice(1) : text
}
