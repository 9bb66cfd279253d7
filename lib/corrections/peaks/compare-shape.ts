import { CorrectionError } from '@/lib/corrections/errors';
import { ontoGrid } from '@/lib/corrections/interpolate';
import { SAME_NM } from '@/lib/corrections/point-math';
import type { CorrectionWarning, Points } from '@/lib/corrections/types';
import { say, warnIf } from '@/lib/corrections/words';

export interface ShapeComparison {
  /** What the standard is multiplied by to come nearest to the sample. */
  readonly scale: number;
  readonly scaleU: number;
  /** Sample minus scaled standard, on the sample's wavelengths of the band. */
  readonly residual: Points;
  readonly residualSd: number;
  /** residualSd over the root mean square of the scaled standard. */
  readonly relativeResidualSd: number;
  readonly worstNm: number;
  readonly worstResidual: number;
  /** Near 2 for residuals that are noise, near 0 for residuals with a shape. */
  readonly durbinWatson: number;
  readonly warnings: readonly CorrectionWarning[];
}

const FEWEST_POINTS = 3;

/**
 * Shape of a sample against a chosen standard by scaled least squares, over a band:
 *
 *     k = Σ A R / Σ R²      e = A - k R      s = √(Σe²/(n - 1))      u(k) = s/√ΣR²      rel = s / (|k| √(ΣR²/n))
 *
 * R is the standard on the sample's wavelengths; points without a number in either are left out. u(k) holds for
 * residuals that are noise.
 *
 * @throws CorrectionError WINDOW_TOO_NARROW below 3 common points; STANDARD_IS_FLAT when all of R is zero
 */
export function compareShape(
  sample: Points,
  standard: Points,
  { fromNm, toNm, limit = 0.05 }: { fromNm: number; toNm: number; limit?: number },
): ShapeComparison {
  const { x, a, r } = common(sample, standard, fromNm, toNm);
  const n = x.length;
  const sum = (of: (i: number) => number) => x.reduce((total, _, i) => total + of(i), 0);
  const squares = sum((i) => (r[i] as number) ** 2);
  if (squares === 0) {
    throw new CorrectionError('STANDARD_IS_FLAT', `the standard reads zero from ${fromNm} to ${toNm} nm`);
  }
  const scale = sum((i) => (a[i] as number) * (r[i] as number)) / squares;
  const e = a.map((y, i) => y - scale * (r[i] as number));
  const residualSquares = e.reduce((total, y) => total + y * y, 0);
  const residualSd = Math.sqrt(residualSquares / (n - 1));
  const relativeResidualSd = residualSd / (Math.abs(scale) * Math.sqrt(squares / n));
  const worst = e.reduce((at, y, i) => (Math.abs(y) > Math.abs(e[at] as number) ? i : at), 0);
  const worstNm = x[worst] as number;
  const worstResidual = e[worst] as number;
  const steps = e.slice(1).reduce((total, y, i) => total + (y - (e[i] as number)) ** 2, 0);
  return {
    scale,
    scaleU: residualSd / Math.sqrt(squares),
    residual: { wavelengthNm: x, absorbance: e },
    residualSd,
    relativeResidualSd,
    worstNm,
    worstResidual,
    durbinWatson: residualSquares === 0 ? 2 : steps / residualSquares,
    warnings: warnIf(
      !(relativeResidualSd <= limit),
      'SHAPE_DIFFERS',
      `The shape differs from the standard’s by ${say(100 * relativeResidualSd, 3)} % (limit ${100 * limit} %), most at ${worstNm} nm: ${say(worstResidual, 3)} of absorbance ${worstResidual > 0 ? 'too much' : 'too little'}. Something else absorbs or scatters, or the band has moved.`,
    ),
  };
}

function common(sample: Points, standard: Points, fromNm: number, toNm: number) {
  const placed = ontoGrid(standard, sample.wavelengthNm).absorbance;
  const kept = sample.wavelengthNm.flatMap((nm, i) => {
    const a = sample.absorbance[i] ?? null;
    const r = placed[i] ?? null;
    const within = nm >= fromNm - SAME_NM && nm <= toNm + SAME_NM;
    return within && a !== null && r !== null ? [{ nm, a, r }] : [];
  });
  if (kept.length < FEWEST_POINTS) {
    throw new CorrectionError(
      'WINDOW_TOO_NARROW',
      `sample and standard have ${kept.length} points in common from ${fromNm} to ${toNm} nm; a shape needs ${FEWEST_POINTS}`,
    );
  }
  return { x: kept.map(({ nm }) => nm), a: kept.map(({ a }) => a), r: kept.map(({ r }) => r) };
}
