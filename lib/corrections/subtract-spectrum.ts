import { CorrectionError } from './errors';
import { ontoGrid } from './interpolate';
import { inQuadrature, SAME_NM, scaled, uAt, withValues } from './point-math';
import type { Points, StepOutcome } from './types';
import { count, say, warnIf } from './words';

export interface Subtrahend {
  readonly name: string;
  readonly points: Points;
  /** What the subtrahend is multiplied by first; 1 when left out. */
  readonly factor?: number;
  readonly factorU?: number;
}

/**
 * Subtract a spectrum, interpolated onto the wavelengths of the sample:
 *
 *     A = A_s - f A_b      u² = u_s² + f² u_b² + A_b² u_f²
 *
 * Where either has no number there is none afterwards, and so it is outside the overlap.
 *
 * @throws CorrectionError RANGES_APART when no wavelength of the sample lies in the range of the other
 */
export function subtractSpectrum(points: Points, subtrahend: Subtrahend): StepOutcome {
  const { name, factor = 1, factorU = 0 } = subtrahend;
  refuseApart(points.wavelengthNm, subtrahend.points.wavelengthNm, name);
  const other = ontoGrid(subtrahend.points, points.wavelengthNm);
  const values = points.absorbance.map((a, i) => {
    const b = other.absorbance[i] as number | null;
    if (a === null || b === null) return { a: null, u: null };
    const uOfFactor = factorU === 0 ? null : Math.abs(b) * factorU;
    return { a: a - factor * b, u: inQuadrature(uAt(points, i), scaled(uAt(other, i), factor), uOfFactor) };
  });
  const lost = values.filter(({ a }, i) => a === null && points.absorbance[i] !== null).length;
  return {
    points: withValues(points.wavelengthNm, values),
    did: `Subtracted ${factor === 1 ? '' : `${say(factor)} times `}“${name}”, interpolated onto the wavelengths of the sample.`,
    warnings: warnIf(
      lost > 0,
      'BLANK_GRID',
      `“${name}” has no number for ${count(lost, 'point')} of ${points.absorbance.length}; they became gaps. Measure it over the whole range of the sample.`,
    ),
  };
}

function refuseApart(sample: readonly number[], other: readonly number[], name: string): void {
  const first = other[0] ?? Infinity;
  const last = other.at(-1) ?? -Infinity;
  if (sample.some((nm) => nm >= first - SAME_NM && nm <= last + SAME_NM)) return;
  throw new CorrectionError(
    'RANGES_APART',
    `“${name}” runs from ${first} to ${last} nm and the sample from ${sample[0]} to ${sample.at(-1)} nm: they do not overlap, so one cannot be subtracted from the other`,
  );
}
