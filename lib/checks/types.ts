/** How the published value came here. */
export type SourceKind = 'seen in print' | 'typed from memory' | 'identity';

/** One published value, and how the engine comes to its own. */
export interface PublishedCheck {
  readonly id: string;
  readonly what: string;
  readonly kind: SourceKind;
  /** As printed: its digits say how far the two can be compared. */
  readonly published: string;
  readonly compute: () => number;
}

/** What one publication gives to check against. */
export interface CheckSource {
  readonly id: string;
  readonly title: string;
  /** The publication. */
  readonly source: string;
  readonly checks: readonly PublishedCheck[];
}

/** A row of a source: what, as printed, ours, and how it came here where that is not as the rest of the source. */
export type CheckRow = readonly [what: string, published: string, compute: () => number, kind?: SourceKind];

/** A source whose values came here the same way, but for the rows that say otherwise; numbered in their order. */
export function sourceOf({
  kind,
  rows,
  ...facts
}: Pick<CheckSource, 'id' | 'title' | 'source'> & {
  readonly kind: SourceKind;
  readonly rows: readonly CheckRow[];
}): CheckSource {
  return {
    ...facts,
    checks: rows.map(([what, published, compute, own], i) => ({
      id: `${facts.id}-${i + 1}`,
      what,
      kind: own ?? kind,
      published,
      compute,
    })),
  };
}
