/** What a spreadsheet takes for the start of a formula. */
const FORMULA = /^[=+\-@]/;

/**
 * A text that a spreadsheet shows as it is: one that would start a formula gets an apostrophe before it.
 * Numbers are never touched, so that a negative value stays a number.
 */
export function guardedText(text: string): string {
  return FORMULA.test(text) ? `'${text}` : text;
}
