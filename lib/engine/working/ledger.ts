/** One line of "show the working". `inputs` are the ids of the lines it was made from. */
export interface WorkingStep {
  readonly id: string;
  readonly label: string;
  readonly symbol: string;
  /** In symbols, right-hand side included: "c = (y0 - a) / b". */
  readonly formula: string;
  /** The same with the numbers put in, up to 7 significant digits each. */
  readonly substituted: string;
  readonly value: number | string;
  readonly unit: string;
  /** Where the formula comes from, or who gave the number. */
  readonly source: string;
  readonly inputs: readonly string[];
}
