/**
 * The lit part of a light disc of radius r, as an SVG path around the origin: the right half circle, closed by the
 * terminator, a half ellipse through both poles.
 *
 *     lit area / πr² = ½ (1 ± rx/r),  so  rx = r·|1 − 2T|  makes it exactly the light fraction T
 *
 * @param fraction T, the fraction of light that got through; below 0 and above 1 it is taken as 0 and 1
 * @param radius   r, in the units of the drawing
 */
export function litPath(fraction: number, radius: number): string {
  const lit = Math.min(1, Math.max(0, fraction));
  const terminator = round(radius * Math.abs(1 - 2 * lit));
  const bulge = lit < 0.5 ? 0 : 1; // less than half: the terminator eats into the lit half; more: it bulges out
  return `M0 ${-radius}A${radius} ${radius} 0 0 1 0 ${radius}A${terminator} ${radius} 0 0 ${bulge} 0 ${-radius}Z`;
}

/** Ends of the hatching lines across a disc of radius r, for a reading that is missing. */
export function hatchLines(radius: number): { x1: number; y1: number; x2: number; y2: number }[] {
  const along = Math.SQRT1_2;
  return [-0.55, 0, 0.55].map((offset) => {
    const distance = offset * radius;
    const half = Math.sqrt(radius * radius - distance * distance);
    return {
      x1: round(along * (distance - half)),
      y1: round(along * (distance + half)),
      x2: round(along * (distance + half)),
      y2: round(along * (distance - half)),
    };
  });
}

/** What a disc says to those who do not see it, from the absorbance as it was read. */
export function lightWords(absorbance: number | null, reason?: string): string {
  if (absorbance === null || Number.isNaN(absorbance)) return reason ?? 'No reading';
  if (absorbance < 0) return 'More light than through the reference: the absorbance is below zero';
  const percent = 100 * 10 ** -absorbance;
  if (percent < 0.01) return 'Less than 0.01 % of the light gets through';
  return `${percentDigits(percent)} % of the light gets through`;
}

function percentDigits(percent: number): string {
  if (percent >= 9.95) return percent.toFixed(0);
  return percent >= 0.95 ? percent.toFixed(1) : percent.toPrecision(1);
}

function round(value: number): number {
  return Math.round(value * 1e4) / 1e4;
}
