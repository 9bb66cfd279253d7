import { significantText } from '../../format/round';
import type { FittedCurve } from '../fit-curve';
import type { OutlierAdvice, PointAnswer } from '../types';
import { dixon } from './dixon';
import { grubbs, largestResidualCritical, type Outlier } from './grubbs';
import { type Level, noScatter } from './levels';

const READINGS_NEEDED = 3;
/** Beyond the second a reading is called an outlier, beyond the first a straggler; one sentence says which. */
const CONFIDENCES = [0.99, 0.95] as const;

const NO_REASON =
  'A test alone is no reason to leave it out: look for the cause (a bubble, a wrong flask, a slip of the pen), and write it down.';

/**
 * Readings that lie apart, as advice and never more: by Grubbs and Dixon among the readings of a level (three or more,
 * of one weight), and by the largest standardised residual among all readings about the curve.
 */
export function outlierAdvice(
  curve: FittedCurve,
  levels: readonly Level[],
  fitted: readonly PointAnswer[],
): readonly OutlierAdvice[] {
  return [
    ...levels.flatMap((level) => amongReplicates(curve, level, fitted)),
    ...amongResiduals(curve, fitted),
  ];
}

function amongReplicates(
  { data }: FittedCurve,
  level: Level,
  fitted: readonly PointAnswer[],
): readonly OutlierAdvice[] {
  const { members } = level;
  const weights = new Set(members.map((i) => data.w[i]));
  if (members.length < READINGS_NEEDED || weights.size > 1 || level.squares <= noScatter(data)) return [];
  const values = members.map((i) => data.y[i] as number);
  const where = `the other readings of ${level.concentration}`;
  const report = (test: 'Grubbs' | 'Dixon', find: (confidence: 0.95 | 0.99) => Outlier | null) => {
    const found = atHighest(find);
    if (found === null) return [];
    const point = fitted[members[found.at] as number] as PointAnswer;
    return [advice(test, 'replicates', point, found, values.length, where)];
  };
  return [
    ...report('Grubbs', (confidence) => grubbs(values, confidence)),
    ...report('Dixon', (confidence) => dixon(values, confidence)),
  ];
}

function amongResiduals({ fit }: FittedCurve, fitted: readonly PointAnswer[]): readonly OutlierAdvice[] {
  const nu = fit.degreesOfFreedom;
  const sizes = fitted.map((point) => Math.abs(point.standardisedResidual ?? 0));
  const statistic = Math.max(...sizes);
  if (nu < 2) return [];
  const at = sizes.indexOf(statistic);
  const found = atHighest((confidence) => ({
    at,
    statistic,
    critical: largestResidualCritical(fit.n, nu, confidence),
  }));
  if (found === null) return [];
  return [advice('Grubbs', 'residuals', fitted[at] as PointAnswer, found, fit.n, 'the curve')];
}

interface Found extends Outlier {
  readonly confidence: 0.95 | 0.99;
}

function atHighest(find: (confidence: 0.95 | 0.99) => Outlier | null): Found | null {
  for (const confidence of CONFIDENCES) {
    const outlier = find(confidence);
    if (outlier !== null && outlier.statistic > outlier.critical) return { ...outlier, confidence };
  }
  return null;
}

function advice(
  test: OutlierAdvice['test'],
  among: OutlierAdvice['among'],
  point: PointAnswer,
  { statistic, critical, confidence }: Found,
  n: number,
  from: string,
): OutlierAdvice {
  const name = among === 'residuals' ? 'Largest standardised residual' : `${test}'s test`;
  const numbers = `${name} ${significantText(statistic, 4)}, limit ${significantText(critical, 4)} at ${confidence * 100} %, ${n} readings`;
  return {
    test,
    among,
    name: point.name,
    standardIndex: point.standardIndex,
    replicate: point.replicate,
    concentration: point.concentration,
    n,
    statistic,
    critical,
    confidence,
    sentence: `Reading ${point.replicate} of ${point.name} lies far from ${from} (${numbers}). ${NO_REASON}`,
  };
}
