import type { FittedCurve } from '../fit-curve';
import { blankErrors } from '../unknown/budget';
import type { ConvertedReadings } from '../unknown/convert-readings';
import type { ReadBack } from '../unknown/read-back';
import type { Random } from './random';

/** Draws c in the measured solution, its reading multiplied by a factor (paths). */
export type Core = (random: Random, readingFactor: number) => number;

/**
 * c read back through a drawn curve. The coefficients, the mean reading and a common blank rest on one estimate s
 * with ν degrees of freedom: each trial draws one χ²_ν for all of them, so that they are jointly a scaled and
 * shifted t. Readings that disagree have their own s with p - 1.
 *
 * @source JCGM 101:2008, 6.4.9, for several quantities that share one estimate
 */
export function curveCore(curve: FittedCurve, readings: ConvertedReadings, back: ReadBack): Core {
  const { fit } = curve;
  const nu = fit.degreesOfFreedom;
  const [b0, b1, b2 = 0] = fit.beta as readonly [number, number, number?];
  const [[l00], [l10, l11], [l20, l21, l22] = [0, 0, 0]] = cholesky(fit.betaCovariance) as Triangle;
  const y0 = readings.meanY as number;
  const uY0 = Math.sqrt(back.varianceY0);
  const ownNu = back.replicates.own ? readings.y.length - 1 : null;
  const blanks = blankErrors(curve, readings, back);
  const { centre, scale } = fit;
  return (random, readingFactor) => {
    const t = Math.sqrt(nu / random.chiSquare(nu));
    const z0 = t * random.normal();
    const z1 = t * random.normal();
    const z2 = fit.model === 'quadratic' ? t * random.normal() : 0;
    const d0 = b0 + l00 * z0;
    const d1 = b1 + l10 * z0 + l11 * z1;
    const d2 = b2 + l20 * z0 + l21 * z1 + l22 * z2;
    const tY = ownNu === null ? t : Math.sqrt(ownNu / random.chiSquare(ownNu));
    const y = (y0 + uY0 * tY * random.normal()) * readingFactor;
    let c = 0;
    if (fit.model === 'quadratic') {
      // As in invert(): the root on the branch of the standards, NaN where the drawn curve has none.
      const rest = y - d0;
      c = centre + (scale * 2 * rest) / (d1 + Math.sign(d1) * Math.sqrt(d1 * d1 + 4 * d2 * rest));
    } else c = centre + (y - d0) / d1;
    for (const blank of blanks) c += blank.sensitivity * blank.u * t * random.normal();
    return c;
  };
}

/** Rows of the triangular factor of two or three coefficients. */
type Triangle = readonly [readonly [number], readonly [number, number], (readonly [number, number, number])?];

/** Lower triangular L with L Lᵀ = V; a direction without variance has a column of zeros. */
export function cholesky(v: readonly (readonly number[])[]): readonly (readonly number[])[] {
  const l: number[][] = [];
  for (const [i, row] of v.entries()) {
    const made: number[] = [];
    for (let j = 0; j <= i; j += 1) {
      const above = i === j ? made : (l[j] as number[]);
      let rest = row[j] as number;
      for (let k = 0; k < j; k += 1) rest -= (made[k] as number) * (above[k] as number);
      const pivot = above[j] as number;
      made.push(i === j ? Math.sqrt(Math.max(0, rest)) : pivot === 0 ? 0 : rest / pivot);
    }
    l.push(made);
  }
  return l;
}
