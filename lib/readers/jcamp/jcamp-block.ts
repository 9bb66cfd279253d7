/** The labels of one block, and of the page at hand, while its records go by. */
export class JcampBlock {
  readonly labels = new Map<string, string>();
  tables = 0;
  page = '';
  private shown: Record<string, string> | undefined;

  constructor(readonly line: number) {}

  set(label: string, value: string): void {
    this.labels.set(label, value);
    this.shown = undefined;
  }

  get isLink(): boolean {
    return /link/i.test(this.labels.get('DATATYPE') ?? '');
  }

  /** The labels as a plain object, made once for all tables that share them. */
  header(): Record<string, string> {
    this.shown ??= Object.fromEntries(this.labels);
    return this.shown;
  }

  /** The n-th item of a list in an NTUPLES record, for the variable with the given symbol. */
  variable(symbol: string, label: string): string {
    const symbols = listOf(this.labels.get('SYMBOL'));
    const at = symbols.findIndex((name) => name.toUpperCase() === symbol.toUpperCase());
    return at < 0 ? '' : (listOf(this.labels.get(label))[at] ?? '');
  }
}

function listOf(value: string | undefined): string[] {
  return (value ?? '').split(',').map((item) => item.trim());
}
