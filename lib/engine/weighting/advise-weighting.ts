import { significantText } from '../../format/round';
import type { FittedCurve } from '../fit-curve';
import { tTwoSidedP } from '../stats/student-t';
import type { PointAnswer, Weighting, WeightingAdvice } from '../types';
import { DEGREES_OF_FREEDOM_NEEDED, type LearnedVarianceFunction } from './learn-variance-function';
import { rankCorrelation } from './rank-correlation';

const ALPHA = 0.05;
/** s0 counts for nothing at the lowest level when it is this small a part of the variance there. */
const SMALL_PART = 0.1;
const READINGS_NEEDED = 6;

/**
 * Which weights the scatter asks for, in one sentence with its reason. Replicates decide where there are any: their
 * variance function, from ten degrees of freedom on. Without replicates the residuals do: whether their size grows
 * with the fitted absorbance under the weights in use (rank correlation).
 */
export function adviseWeighting(
  curve: FittedCurve,
  learned: LearnedVarianceFunction | null,
  fitted: readonly PointAnswer[],
): WeightingAdvice {
  const inUse = curve.request.weighting;
  const found = learned === null ? fromResiduals(inUse, fitted) : fromReplicates(learned, fitted);
  return { ...found, inUse, agrees: found.advised === null || family(found.advised) === family(inUse) };
}

type Found = Omit<WeightingAdvice, 'inUse' | 'agrees'>;

/** Weightings that say the same of how the variance grows. */
function family(weighting: Weighting): string {
  if (weighting === '1/y2') return '1/x2';
  return weighting === '1/y' ? '1/x' : weighting;
}

function fromReplicates(learned: LearnedVarianceFunction, fitted: readonly PointAnswer[]): Found {
  const { s0, k, degreesOfFreedom, adviceOnly, pConstant } = learned;
  const basis = 'replicates' as const;
  const p = `p ${significantText(pConstant, 2)}`;
  const over = `${degreesOfFreedom} degrees of freedom of replicates`;
  if (pConstant >= ALPHA) {
    const few = adviceOnly ? `, though fewer than ${DEGREES_OF_FREEDOM_NEEDED} can hide a growth` : '';
    const sentence = `No weights are called for: over ${over} the scatter does not grow with the absorbance (${p})${few}.`;
    return { advised: 'none', basis, sentence };
  }
  const sizes = fitted.map((point) => Math.abs(point.fitted));
  const [low, high] = [Math.min(...sizes), Math.max(...sizes)];
  const growth = Math.hypot(s0, k * high) / Math.hypot(s0, k * low);
  const grows = `the scatter grows ${significantText(growth, 2)} times from the lowest to the highest level (${p}, ${over})`;
  if (adviceOnly) {
    const sentence = `Weights such as 1/x are called for: ${grows}, but fewer than ${DEGREES_OF_FREEDOM_NEEDED} degrees of freedom do not say by which law.`;
    return { advised: '1/x', basis, sentence };
  }
  if (s0 ** 2 <= SMALL_PART * (k * low) ** 2) {
    const sentence = `Weights 1/y² are called for: ${grows}, in proportion to the absorbance (${significantText(100 * k, 2)} % of it).`;
    return { advised: '1/y2', basis, sentence };
  }
  const sentence = `A variance function with s0 = ${significantText(s0, 2)} and k = ${significantText(k, 2)} is called for: ${grows}.`;
  return { advised: 'varianceFunction', basis, sentence };
}

function fromResiduals(inUse: Weighting, fitted: readonly PointAnswer[]): Found {
  const known = fitted.filter((point) => typeof point.standardisedResidual === 'number');
  const n = known.length;
  if (n < READINGS_NEEDED) {
    const sentence = `There are no replicates and fewer than ${READINGS_NEEDED} residuals: nothing can be said about weights. Read every standard more than once.`;
    return { advised: null, basis: 'nothing', sentence };
  }
  const basis = 'residuals' as const;
  const rank = rankCorrelation(
    known.map((point) => point.fitted),
    known.map((point) => Math.abs(point.standardisedResidual as number)),
  );
  const left = Math.max(Number.MIN_VALUE, 1 - rank * rank);
  const p = tTwoSidedP(rank * Math.sqrt((n - 2) / left), n - 2);
  const numbers = `(rank correlation ${significantText(rank, 2)}, p ${significantText(p, 2)}, no replicates)`;
  if (p >= ALPHA) {
    const sentence = `The weights in use suit: the size of the residuals has no trend along the curve ${numbers}.`;
    return { advised: inUse, basis, sentence };
  }
  if (rank < 0) {
    const advised = inUse === 'none' ? null : 'none';
    const what = inUse === 'none' ? 'Look at the low standards' : 'Weaker weights or none are called for';
    return { advised, basis, sentence: `${what}: residuals shrink along the curve ${numbers}.` };
  }
  const advised = inUse === 'none' ? '1/x' : '1/x2';
  const sentence = `Weights ${advised === '1/x' ? '1/x' : '1/x²'} are called for: residuals grow along the curve ${numbers}.`;
  return { advised, basis, sentence };
}
