import type { ChartLabel } from './chart-model';

/** The labels that can stand without touching one above them; the first given goes first. */
export function placeLabels(
  labels: readonly ChartLabel[],
  pxPerY: number,
  pxPerX: number,
  lineHeight = 14,
): ChartLabel[] {
  const placed: ChartLabel[] = [];
  for (const label of labels) {
    const meets = placed.some(
      (other) =>
        Math.abs(other.y - label.y) * pxPerY < lineHeight &&
        Math.abs(other.x - label.x) * pxPerX < 3.5 * (other.text.length + label.text.length),
    );
    if (!meets) placed.push(label);
  }
  return placed;
}
