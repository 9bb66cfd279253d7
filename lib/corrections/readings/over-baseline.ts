import type { ReadingRule } from '@/lib/engine/spectrum/read-spectrum';
import { lineThrough } from '@/lib/corrections/baselines';
import { CorrectionError } from '@/lib/corrections/errors';
import { ontoGrid } from '@/lib/corrections/interpolate';
import { inQuadrature, SAME_NM, scaled, uAt } from '@/lib/corrections/point-math';
import { readingBy } from '@/lib/corrections/reading-at';
import type { Points } from '@/lib/corrections/types';

export interface Reading {
  readonly value: number;
  /** Null when the points carry no uncertainty. */
  readonly u: number | null;
}

export interface PeakHeight extends Reading {
  readonly atNm: number;
  /** The line's value under the reading. */
  readonly baseline: number;
}

export interface Area extends Reading {
  /** nm, for the value in absorbance × nm. */
  readonly fromNm: number;
  readonly toNm: number;
}

/** The two wavelengths a baseline runs through. */
export interface Ends {
  readonly lowNm: number;
  readonly highNm: number;
}

/**
 * Height of a reading over the straight line between two others: h = A - L(λ), u² = u(A)² + u(L)². The rule is any
 * of the engine's (point, interpolated, mean of a band, highest of a window); it is read first and the line taken
 * off where it was read, so the highest of a window is the highest of the spectrum, not of what stands over the line.
 *
 * @throws EngineError as readSpectrum; CorrectionError READING_IS_GAP, WAVELENGTHS_NOT_IN_ORDER
 */
export function peakHeight(points: Points, rule: ReadingRule, { lowNm, highNm }: Ends): PeakHeight {
  const line = lineThrough(points, lowNm, highNm);
  const reading = readingBy(points, rule);
  const baseline = line.valueAt(reading.atNm);
  const u = reading.u === null ? null : inQuadrature(reading.u, line.uAt(reading.atNm));
  return { value: reading.value - baseline, u, atNm: reading.atNm, baseline };
}

/**
 * Area by the trapezoid rule, in absorbance × nm, over zero or over the line through two readings:
 *
 *     S = Σ w_i (A_i - L_i)      w_i = half the distance between the neighbours of i
 *
 * The ends are interpolated when no point stands there. u² = Σ w_i² u(A_i)² with independent errors; the line's
 * errors are one for the whole and add as w_total-weighted u of its middle: u(L at the centre of the range) times
 * the width, which is exact for a line.
 *
 * @throws EngineError WAVELENGTH_OUTSIDE; CorrectionError WAVELENGTHS_NOT_IN_ORDER, READING_IS_GAP (a gap inside)
 */
export function area(points: Points, fromNm: number, toNm: number, baseline: Ends | null = null): Area {
  if (!(toNm - fromNm > SAME_NM)) {
    throw new CorrectionError(
      'WAVELENGTHS_NOT_IN_ORDER',
      `an area runs from ${fromNm} to ${toNm} nm, upwards`,
    );
  }
  // the ends are read by the rule, so that outside the spectrum is refused in the engine's words
  for (const wavelengthNm of [fromNm, toNm]) readingBy(points, { kind: 'interpolated', wavelengthNm });
  const inner = points.wavelengthNm.filter((nm) => nm > fromNm + SAME_NM && nm < toNm - SAME_NM);
  const part = ontoGrid(points, [fromNm, ...inner, toNm]);
  const total = trapezoid(part);
  if (baseline === null) return { ...total, fromNm, toNm };
  const line = lineThrough(points, baseline.lowNm, baseline.highNm);
  const width = toNm - fromNm;
  const middle = (fromNm + toNm) / 2;
  return {
    value: total.value - line.valueAt(middle) * width,
    u: total.u === null ? null : inQuadrature(total.u, scaled(line.uAt(middle), width)),
    fromNm,
    toNm,
  };
}

function trapezoid(part: Points): Reading {
  const { wavelengthNm: x, absorbance } = part;
  let value = 0;
  let squares = 0;
  let known = part.u !== undefined;
  x.forEach((nm, i) => {
    const a = absorbance[i] as number | null;
    if (a === null) {
      throw new CorrectionError('READING_IS_GAP', `the spectrum has no number at ${nm} nm, inside the area`);
    }
    const weight = ((x[i + 1] ?? nm) - (x[i - 1] ?? nm)) / 2;
    value += weight * a;
    const u = uAt(part, i);
    known = known && u !== null;
    squares += (weight * (u ?? 0)) ** 2;
  });
  return { value, u: known ? Math.sqrt(squares) : null };
}
