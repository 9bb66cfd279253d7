import type { Fit } from '../regression/fit';

/**
 * The concentration where the curve has the value y: (y - a)/b for lines; for a quadratic the root on the branch
 * that rises (or falls) through the standards, in the form that does not cancel. Null where it has none.
 *
 * @source ISO 8466-2 for the quadratic, in our own words
 */
export function invert(fit: Fit, y: number): number | null {
  const [b0 = 0, b1 = 0, b2 = 0] = fit.beta;
  if (fit.model !== 'quadratic') return fit.centre + (y - b0) / b1;
  const rest = y - b0;
  const discriminant = b1 * b1 + 4 * b2 * rest;
  if (discriminant < 0) return null;
  const t = (2 * rest) / (b1 + Math.sign(b1) * Math.sqrt(discriminant));
  return fit.centre + fit.scale * t;
}
