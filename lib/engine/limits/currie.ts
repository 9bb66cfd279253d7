import { tQuantile } from '../stats/student-t';
import type { LimitAnswer } from '../types';
import type { BlankScatter } from './blank-scatter';

const RISK = 0.05;

/**
 * L_C = t(0.95; ν) s_blank √(1 + 1/m) / S and L_D = 2 L_C, where the mean of m blanks is taken off. With m = 1 the
 * blank is paired and as uncertain as the sample, with m infinite it is well known: for a known standard deviation
 * 2.33 and 4.65, and 1.645 and 3.29 times it.
 *
 * @param nu degrees of freedom of s_blank, Infinity when it is known
 * @source Currie, IUPAC Recommendations 1995, in our own words
 */
export function currieLevels(
  { sd, slope }: Pick<BlankScatter, 'sd' | 'slope'>,
  nu: number,
  m: number,
): { readonly critical: number; readonly detection: number } {
  const critical = (tQuantile(1 - RISK, nu) * sd * Math.sqrt(1 + 1 / m)) / slope;
  return { critical, detection: 2 * critical };
}

interface Variant {
  readonly name: string;
  readonly m: (n: number) => number;
  readonly formula: string;
  readonly basis: string;
}

const MEAN_OF_ALL: Variant = {
  name: '',
  m: (n) => n,
  formula: 't(0.95; n - 1) * s * sqrt(1 + 1 / n) / S',
  basis: '',
};
const PAIRED: Variant = {
  name: ', paired blank',
  m: () => 1,
  formula: 't(0.95; n - 1) * s * sqrt(2) / S',
  basis: ', one blank taken off each sample',
};
const WELL_KNOWN: Variant = {
  name: ', well-known blank',
  m: () => Infinity,
  formula: 't(0.95; n - 1) * s / S',
  basis: ', the mean blank taken as known',
};

/** The limits with the mean of the very blanks taken off; with `variants` those of the other two blanks as well. */
export function currieLimits(blank: BlankScatter, variants = false): readonly LimitAnswer[] {
  const basis = `${blank.n} ${blank.of}, one-sided 95 %`;
  return (variants ? [MEAN_OF_ALL, PAIRED, WELL_KNOWN] : [MEAN_OF_ALL]).flatMap((variant) => {
    const { critical, detection } = currieLevels(blank, blank.n - 1, variant.m(blank.n));
    const source = 'Currie, IUPAC 1995';
    return [
      {
        name: `Currie critical level${variant.name}`,
        kind: 'critical' as const,
        value: critical,
        basis: `${basis}${variant.basis}`,
        formula: variant.formula,
        alpha: RISK,
        beta: null,
        source,
      },
      {
        name: `Currie detection limit${variant.name}`,
        kind: 'detection' as const,
        value: detection,
        basis: `twice the critical level; ${basis}${variant.basis}`,
        formula: `2 * ${variant.formula}`,
        alpha: RISK,
        beta: RISK,
        source,
      },
    ];
  });
}
