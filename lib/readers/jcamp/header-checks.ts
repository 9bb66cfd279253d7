import type { ReaderWarning } from '../types';

/** The number of a header record, or NaN. Decimal commas occur there, too. */
export function headerNumber(text: string | undefined): number {
  if (text === undefined) return NaN;
  const word = /^[+-]?(?:\d+[.,]?\d*|[.,]\d+)(?:[eEdD][+-]?\d+)?/.exec(text.trim())?.[0];
  return word === undefined ? NaN : Number(word.replace(',', '.').replace(/d/i, 'e'));
}

/** Relative difference that rounding in a header explains. */
const ROUNDING = 2e-3;

/**
 * Hold the values a header declares against the data. The header is wrong about as often as the data are, so that a
 * difference is told and nothing is rescaled.
 */
export function headerChecks(
  labels: ReadonlyMap<string, string>,
  x: Float64Array,
  y: Float64Array,
  yFactor: number,
): ReaderWarning[] {
  const warnings: ReaderWarning[] = [];
  let [minY, maxY] = [Infinity, -Infinity];
  for (const value of y) {
    if (value < minY) minY = value;
    if (value > maxY) maxY = value;
  }
  const size = Math.max(Math.abs(minY), Math.abs(maxY));
  const compare = (label: string, actual: number, slack: number): void => {
    const declared = headerNumber(labels.get(label));
    if (Number.isNaN(declared) || !Number.isFinite(actual) || Math.abs(declared - actual) <= slack) return;
    const ratio = actual / declared;
    const power = Math.round(Math.log10(Math.abs(ratio)));
    const scaled = power !== 0 && Math.abs(ratio / 10 ** power - 1) < 0.01;
    const by = scaled ? `, a factor of 1e${power}` : '';
    warnings.push({
      code: label,
      message: `${label} says ${declared}, but the data give ${actual}${by}; the data were kept as they are`,
      value: actual,
    });
  };
  const slackY = ROUNDING * size + 0.5 * Math.abs(yFactor);
  compare('FIRSTY', y[0] ?? NaN, Math.min(slackY, ROUNDING * Math.abs(y[0] ?? 0) + 0.5 * Math.abs(yFactor)));
  compare('MAXY', maxY, slackY);
  compare('MINY', minY, slackY);
  const first = x[0] ?? NaN;
  const last = x[x.length - 1] ?? NaN;
  const slackX = x.length > 1 ? Math.abs((last - first) / (x.length - 1)) / 10 : 0;
  compare('FIRSTX', first, slackX);
  compare('LASTX', last, slackX);
  compare('MAXX', Math.max(first, last), slackX);
  compare('MINX', Math.min(first, last), slackX);
  return warnings;
}
