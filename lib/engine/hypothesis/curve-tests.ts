import type { FittedCurve } from '../fit-curve';
import type { CurveJudgements, CurveResult, PointAnswer } from '../types';
import { adviseWeighting } from '../weighting/advise-weighting';
import { learnVarianceFunction } from '../weighting/learn-variance-function';
import { replicateScatter } from '../weighting/replicate-scatter';
import { cochran } from './cochran';
import { homogeneity } from './homogeneity';
import { interceptTest } from './intercept';
import { interceptSize } from './intercept-size';
import { lackOfFit } from './lack-of-fit';
import { levene } from './levene';
import type { Level } from './levels';
import { mandel } from './mandel';
import { outlierAdvice } from './outliers';

/** Every test of a curve, made or with the reason why it could not be. */
export function curveTests(curve: FittedCurve, levels: readonly Level[]): CurveResult['tests'] {
  return {
    lackOfFit: lackOfFit(curve, levels),
    mandel: mandel(curve, levels),
    intercept: interceptTest(curve, levels),
    homogeneity: homogeneity(curve, levels),
    cochran: cochran(curve, levels),
    levene: levene(curve, levels),
  };
}

/** What is said about a curve beside its tests. */
export function curveJudgements(
  curve: FittedCurve,
  levels: readonly Level[],
  points: readonly PointAnswer[],
): CurveJudgements {
  const fitted = points.filter((point) => !point.excluded);
  const learned = learnVarianceFunction(replicateScatter(curve.active));
  return {
    weighting: adviseWeighting(curve, learned, fitted),
    varianceFunction: learned ?? {
      reason:
        'A variance function is learned from replicates: two readings or more, that differ, at two levels at least.',
    },
    outliers: outlierAdvice(curve, levels, fitted),
    interceptSize: interceptSize(curve),
  };
}
