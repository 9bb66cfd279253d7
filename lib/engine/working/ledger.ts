import { significantText } from '../../format/round';

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

/** Sums of more terms than this are written by their first and last terms. */
const TERMS_WRITTEN = 40;

export interface LineText {
  readonly id: string;
  readonly label: string;
  readonly symbol: string;
  readonly unit?: string;
  readonly source: string;
}

/** Ids of the lines behind the symbols of a formula. */
export type From = Readonly<Record<string, string>>;

export function numberText(x: number | string): string {
  if (typeof x === 'string') return x;
  const text = significantText(x, 7);
  return x < 0 ? `(${text})` : text;
}

/** A formula cut at its symbols: literal, symbol, literal, symbol, ..., literal. Every symbol has its line. */
type Template = readonly string[];

const templates = new Map<string, Template>();

/** Cuts at symbols as whole words, longest first, so that "s" is not found in "sqrt". Kept, since formulas recur. */
function templateOf(expression: string, symbols: readonly string[]): Template {
  const key = `${expression}\n${symbols.join(' ')}`;
  const found = templates.get(key);
  if (found) return found;
  const longestFirst = [...symbols].sort((a, b) => b.length - a.length);
  const escaped = longestFirst.map((symbol) => symbol.replace(/[()^|.*+?[\]{}\\]/g, '\\$&'));
  const cut = new RegExp(`(?<![\\w.])(${escaped.join('|')})(?![\\w(])`);
  const made = symbols.length === 0 ? [expression] : expression.split(cut);
  templates.set(key, made);
  return made;
}

/**
 * The derivation as data. Every line is recorded by the calculation itself, at the moment it has the value, and
 * names the lines it was made from; the substituted text is made from those lines' values, so it cannot say
 * anything that was not calculated.
 */
export class Ledger {
  private readonly recorded: WorkingStep[] = [];
  /** The text of each line's value. */
  private readonly texts = new Map<string, string>();

  /**
   * @param above lines recorded elsewhere (the curve's) that lines here may be made from
   * @param record writes the lines when somebody first asks for one: writing them takes longer than the whole
   *   calculation, and a page that recalculates at every keystroke shows them only on request
   */
  constructor(
    private readonly above?: Ledger,
    private record?: (ledger: Ledger) => void,
  ) {}

  get steps(): readonly WorkingStep[] {
    this.settle();
    return this.recorded;
  }

  private settle(): void {
    const { record } = this;
    this.record = undefined;
    record?.(this);
  }

  /** A number that was given, not calculated. */
  given(text: LineText, value: number | string): void {
    this.add(text, text.symbol, numberText(value), value, []);
  }

  /** A value calculated by `expression`, whose symbols stand for the lines named in `from`. */
  line(text: LineText, expression: string, from: From, value: number | string): void {
    const numbers = this.fill(templateOf(expression, Object.keys(from)), from);
    this.add(text, `${text.symbol} = ${expression}`, numbers, value, distinct(Object.values(from)));
  }

  /** A sum over points: `expression` for one term, `terms` the ids behind its symbols, point by point. */
  sum(text: LineText, expression: string, terms: readonly From[], value: number, divisor?: From): void {
    const [over] = Object.entries(divisor ?? {});
    const written = terms.length <= TERMS_WRITTEN ? terms : [...terms.slice(0, 2), ...terms.slice(-1)];
    // A sum has one term at least.
    const template = templateOf(expression, Object.keys(terms[0] as From));
    const texts = written.map((from) => this.fill(template, from));
    if (terms.length > TERMS_WRITTEN) texts.splice(2, 0, `... ${terms.length - 3} more terms ...`);
    const sumText = texts.join(' + ');
    const inputs = new Set(Object.values(divisor ?? {}));
    for (const from of terms) for (const id of Object.values(from)) inputs.add(id);
    this.add(
      text,
      `${text.symbol} = sum(${expression})${over ? ` / ${over[0]}` : ''}`,
      over ? `(${sumText}) / ${this.shown(over[1])}` : sumText,
      value,
      [...inputs],
    );
  }

  /** A value that no short formula gives (a matrix solved, a case chosen): says how, and what it was made from. */
  solved(text: LineText, how: string, inputs: readonly string[], value: number | string): void {
    this.add(text, `${text.symbol}: ${how}`, numberText(value), value, inputs);
  }

  /** Of these ids, the ones that have a line. */
  present(ids: readonly string[]): readonly string[] {
    return ids.filter((id) => this.textOf(id) !== undefined);
  }

  private textOf(id: string): string | undefined {
    this.settle();
    return this.texts.get(id) ?? this.above?.textOf(id);
  }

  private fill(template: Template, from: From): string {
    let text = '';
    for (let i = 0; i < template.length; i += 1) {
      const part = template[i] as string;
      text += i % 2 === 0 ? part : this.shown(from[part] as string);
    }
    return text;
  }

  private shown(id: string): string {
    const text = this.textOf(id);
    // Not a wrong call from outside: a line was recorded before what it is made from.
    if (text === undefined) throw new Error(`the working has no line ${id}`);
    return text;
  }

  private add(
    { id, label, symbol, unit = '', source }: LineText,
    formula: string,
    numbers: string,
    value: number | string,
    inputs: readonly string[],
  ): void {
    const substituted = `${symbol} = ${numbers}`;
    this.recorded.push({ id, label, symbol, formula, substituted, value, unit, source, inputs });
    this.texts.set(id, numberText(value));
  }
}

function distinct(ids: readonly string[]): readonly string[] {
  return ids.length < 2 ? ids : [...new Set(ids)];
}
