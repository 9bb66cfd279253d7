const FIGURE_SPACE = '\u2007';

/** Number texts padded with figure spaces so that their decimal points stand under each other. */
export function alignDecimals(texts: readonly string[]): string[] {
  const parts = texts.map((text) => {
    const [whole = '', fraction] = text.split('.');
    return { whole, fraction };
  });
  const before = Math.max(0, ...parts.map(({ whole }) => whole.length));
  const after = Math.max(
    0,
    ...parts.map(({ fraction }) => (fraction === undefined ? 0 : fraction.length + 1)),
  );
  return parts.map(({ whole, fraction }) => {
    const tail = fraction === undefined ? '' : `.${fraction}`;
    return whole.padStart(before, FIGURE_SPACE) + tail.padEnd(after, FIGURE_SPACE);
  });
}
