import { cochranCritical } from '@/lib/engine/hypothesis/cochran';
import { grubbsCritical } from '@/lib/engine/hypothesis/grubbs';
import { fQuantile } from '@/lib/engine/stats/f-distribution';
import { detectionDelta } from '@/lib/engine/stats/noncentral-t';
import { tQuantile } from '@/lib/engine/stats/student-t';
import { studentizedRangeQuantile } from '@/lib/engine/stats/studentized-range';
import { coverageFactor, effectiveDegreesOfFreedom } from '@/lib/engine/uncertainty/expand';
import { type CheckRow, type CheckSource, sourceOf } from '../types';

/** A printed table of one argument as rows. */
function table(
  printed: Readonly<Record<number, string>>,
  what: (argument: number) => string,
  compute: (argument: number) => number,
): readonly CheckRow[] {
  return Object.entries(printed).map(([key, published]): CheckRow => {
    const argument = Number(key);
    return [what(argument), published, () => compute(argument)];
  });
}

/** Published components with their degrees of freedom: 0.25 % (9), 0.57 % (4), 0.82 % (14). */
const COMPONENTS = [
  { u: 0.25, degreesOfFreedom: 9 },
  { u: 0.57, degreesOfFreedom: 4 },
  { u: 0.82, degreesOfFreedom: 14 },
];

function gum(): CheckSource {
  const nu = () => effectiveDegreesOfFreedom(COMPONENTS, 0);
  return sourceOf({
    id: 'gum',
    title: 'Effective degrees of freedom',
    source: 'JCGM 100:2008 (GUM), example in G.4',
    kind: 'typed from memory',
    rows: [
      ['effective degrees of freedom', '19.0', nu],
      ['coverage factor at 95 %', '2.09', () => coverageFactor(0.95, nu())],
    ],
  });
}

const T_975 = {
  1: '12.706',
  2: '4.303',
  4: '2.776',
  5: '2.571',
  6: '2.447',
  8: '2.306',
  10: '2.228',
  13: '2.160',
  30: '2.042',
  100: '1.984',
};
const T_95 = { 1: '6.314', 5: '2.015', 10: '1.812', 30: '1.697' };

function studentT(): CheckSource {
  return sourceOf({
    id: 't',
    title: "Student's t",
    source: 'NIST/SEMATECH e-Handbook of Statistical Methods, table of critical values',
    kind: 'seen in print',
    rows: [
      ...table(
        T_975,
        (nu) => `t(0.975; ${nu})`,
        (nu) => tQuantile(0.975, nu),
      ),
      ...table(
        T_95,
        (nu) => `t(0.95; ${nu})`,
        (nu) => tQuantile(0.95, nu),
      ),
    ],
  });
}

const F_TABLE: readonly (readonly [number, number, number, string])[] = [
  [0.95, 1, 10, '4.965'],
  [0.95, 5, 5, '5.050'],
  [0.95, 1, 7, '5.591'],
  [0.99, 1, 7, '12.246'],
  [0.99, 9, 9, '5.351'],
  [0.95, 9, 9, '3.179'],
];

function fisher(): CheckSource {
  return sourceOf({
    id: 'f',
    title: 'F',
    source: 'Tables of the F distribution, as in textbooks of statistics',
    kind: 'typed from memory',
    rows: F_TABLE.map(([level, df1, df2, published]): CheckRow => [
      `F(${level}; ${df1}, ${df2})`,
      published,
      () => fQuantile(level, df1, df2),
    ]),
  });
}

const DELTA = {
  2: '5.516',
  3: '4.456',
  4: '4.067',
  5: '3.870',
  6: '3.752',
  7: '3.673',
  8: '3.617',
  9: '3.575',
  10: '3.543',
};

function detection(): CheckSource {
  return sourceOf({
    id: 'delta',
    title: 'Non-centrality for the detectable value',
    source: 'ISO 11843-1:1997, table of δ(ν; 0.05; 0.05)',
    kind: 'seen in print',
    rows: table(
      DELTA,
      (nu) => `δ(${nu}; 0.05; 0.05)`,
      (nu) => detectionDelta(nu, 0.05, 0.05),
    ),
  });
}

const COCHRAN = {
  2: '0.975',
  3: '0.871',
  4: '0.768',
  5: '0.684',
  6: '0.616',
  7: '0.561',
  8: '0.516',
  9: '0.477',
  10: '0.445',
};
/** Without the sizes at which printed tables differ from each other in the last digit or hold a misprint. */
const GRUBBS = {
  4: '1.481',
  5: '1.715',
  6: '1.887',
  9: '2.215',
  10: '2.290',
  11: '2.355',
  12: '2.412',
  13: '2.462',
  14: '2.507',
};

function outliers(): CheckSource {
  return sourceOf({
    id: 'outliers',
    title: 'Outlying values and variances',
    source: 'Grubbs and Beck, Technometrics 14 (1972) 847; Cochran as in ISO 5725-2; both at 5 %',
    kind: 'seen in print',
    rows: [
      ...table(
        GRUBBS,
        (n) => `Grubbs, ${n} values, two-sided`,
        (n) => grubbsCritical(n, 0.95),
      ),
      ...table(
        COCHRAN,
        (k) => `Cochran, ${k} levels of 3`,
        (k) => cochranCritical(k, 3, 0.95),
      ),
    ],
  });
}

/** Values, degrees of freedom, q. */
const RANGE: readonly (readonly [number, number, string])[] = [
  [2, 12, '3.08'],
  [3, 10, '3.88'],
  [3, 5, '4.60'],
  [4, 8, '4.53'],
  [5, 20, '4.23'],
];

function studentizedRange(): CheckSource {
  return sourceOf({
    id: 'range',
    title: 'The studentized range',
    source: 'H. L. Harter, Annals of Mathematical Statistics 31 (1960) 1122',
    kind: 'typed from memory',
    rows: RANGE.map(([count, nu, published]): CheckRow => [
      `q(0.95; ${count}, ${nu})`,
      published,
      () => studentizedRangeQuantile(0.95, count, nu),
    ]),
  });
}

/** Tables of critical values, and degrees of freedom. */
export function statistics(): readonly CheckSource[] {
  return [gum(), studentT(), fisher(), detection(), outliers(), studentizedRange()];
}
