/**
 * Text that a spreadsheet would take for a formula gets an apostrophe in front, so that a tag such as `=cmd` that came
 * with somebody's list is never run when the file is opened; reading takes the apostrophe off again.
 */
const formulaLike = /^'*[=+\-@]/
const guarded = /^'+[=+\-@]/

export function guardFormula(text: string): string {
  return formulaLike.test(text) ? `'${text}` : text
}

export function unguardFormula(text: string): string {
  return guarded.test(text) ? text.slice(1) : text
}
