/** Labels shown with a spectrum; a file with more of them repeats none for every page. */
const MOST_SHOWN = 200;
/** Variables of an NTUPLES block. */
const MOST_VARIABLES = 100;

/** The labels of one block, and of the page at hand, while its records go by. */
export class JcampBlock {
  readonly labels = new Map<string, string>();
  tables = 0;
  page = '';
  private shown: Record<string, string> | undefined;
  private readonly lists = new Map<string, readonly string[]>();

  constructor(readonly line: number) {}

  set(label: string, value: string): void {
    this.labels.set(label, value);
    this.lists.delete(label);
    this.shown = undefined;
  }

  get isLink(): boolean {
    return /link/i.test(this.labels.get('DATATYPE') ?? '');
  }

  /** The labels as a plain object, made once for all tables that share them; all of them stand in the header text. */
  header(): Record<string, string> {
    this.shown ??= Object.fromEntries([...firstOf(this.labels, MOST_SHOWN)]);
    return this.shown;
  }

  /** The n-th item of a list in an NTUPLES record, for the variable with the given symbol. */
  variable(symbol: string, label: string): string {
    const at = this.list('SYMBOL').findIndex((name) => name.toUpperCase() === symbol.toUpperCase());
    return at < 0 ? '' : (this.list(label)[at] ?? '');
  }

  private list(label: string): readonly string[] {
    const known = this.lists.get(label);
    if (known) return known;
    const items = (this.labels.get(label) ?? '').split(',', MOST_VARIABLES).map((item) => item.trim());
    this.lists.set(label, items);
    return items;
  }
}

function* firstOf<T>(items: Iterable<T>, most: number): Generator<T> {
  let taken = 0;
  for (const item of items) {
    if (taken >= most) return;
    taken += 1;
    yield item;
  }
}
