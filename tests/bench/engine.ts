import type { CurveRequest } from '@/lib/engine';
import { calculateStandardCurve, compareModels, effectOfLeavingOut } from '@/lib/engine';
import { qr } from '@/lib/engine/matrices';
import type { FitData } from '@/lib/engine/regression/fit';
import { fitLine } from '@/lib/engine/regression/fit-line';
import { fitQuadratic } from '@/lib/engine/regression/fit-quadratic';
import { householder } from '@/lib/engine/regression/qr';
import { type Measured, measure, measureInTurn, report } from './measure';

const LEVELS = [0, 0.1, 0.25, 0.5, 1, 2, 4];

/** A curve of 14 points; `round` makes every one another, so that no quantile or text is met twice in its p. */
function curveRequest(unknowns: number, round = 0): CurveRequest {
  const at = (concentration: number) => 0.0043 + 0.198 * concentration + 1e-6 * (round % 997);
  return {
    signal: 'absorbance',
    pathLengthMm: 10,
    unit: 'mg/L',
    formulaMass: 55.845,
    model: 'linear',
    weighting: 'none',
    confidence: 0.95,
    absorbanceLimit: 2,
    standards: LEVELS.map((concentration, index) => ({
      concentration,
      readings: [at(concentration), 0.0043 + 0.198 * concentration + 0.0005 * (index % 3)],
    })),
    unknowns: Array.from({ length: unknowns }, (_, index) => ({
      name: `S${index}`,
      readings: [0.1 + 0.005 * index, 0.101 + 0.005 * index],
      dilution: [{ takenMl: 25, toMl: 50, takenUMl: 0.02, toUMl: 0.03 }],
    })),
  };
}

/** A line of n points with a little wave on it. */
function lineOf(n: number, shift = 0): FitData {
  const x = Array.from({ length: n }, (_, i) => (10 * i) / n);
  return { x, y: x.map((value, i) => 0.01 + 0.2 * value + 1e-3 * Math.sin(i + shift)), w: x.map(() => 1) };
}

/** The least a straight line can cost: means in one pass, sums about them in the next. */
function bareTwoPasses({ x, y }: FitData): number {
  const n = x.length;
  let sumX = 0;
  let sumY = 0;
  for (let i = 0; i < n; i += 1) {
    sumX += x[i] as number;
    sumY += y[i] as number;
  }
  const [meanX, meanY] = [sumX / n, sumY / n];
  let sxx = 0;
  let sxy = 0;
  for (let i = 0; i < n; i += 1) {
    const dx = (x[i] as number) - meanX;
    sxx += dx * dx;
    sxy += dx * ((y[i] as number) - meanY);
  }
  return sxy / sxx;
}

let round = 0;
const next = () => (round += 1);

/** Figures of the fits, of their judgements and of what compares curves. */
export function benchEngine(reference: Measured): void {
  const many = { runs: 2000, warmUp: 500 };
  const twelve = Array.from({ length: 10_000 }, (_, i) => lineOf(12, i));
  report(
    measure('10,000 bare fits of 12 points', () => twelve.map((data) => fitLine(data))),
    reference,
  );
  report(
    measure('10,000 quadratics of 12 points', () => twelve.map((data) => fitQuadratic(data))),
    reference,
  );
  const long = lineOf(10_000);
  const [line, bare] = measureInTurn([
    ['a straight line through 10,000 points', () => fitLine(long)],
    ['the bare two-pass loop over the same arrays', () => bareTwoPasses(long)],
  ]);
  if (line && bare) report(line, bare);
  report(
    measure(
      'curve of 14 points with all its judgements',
      () => calculateStandardCurve(curveRequest(0, next())),
      many,
    ),
    reference,
  );
  report(
    measure(
      'the same with its working written out',
      () => calculateStandardCurve(curveRequest(0, next())).curve.working,
      many,
    ),
    reference,
  );
  report(
    measure(
      '20 unknowns with it, budgets, no working',
      () => calculateStandardCurve(curveRequest(20, next())),
      {
        runs: 300,
      },
    ),
    reference,
  );
  report(
    measure('every model and weighting, 20 unknowns', () => compareModels(curveRequest(20, next()))),
    reference,
  );
  report(
    measure('each standard and reading left out, 20 unknowns', () =>
      effectOfLeavingOut(curveRequest(20, next())),
    ),
    reference,
  );
  benchDecompositions();
}

/** Why the decomposition is our own. */
function benchDecompositions(): void {
  for (const n of [12, 200]) {
    const columns = [0, 1, 2].map((power) => Array.from({ length: n }, (_, i) => (i / n) ** power));
    const rows = (columns[0] ?? []).map((_, i) => columns.map((column) => column[i] ?? 0));
    const own = measure('our own', () => householder(columns), { runs: 300, warmUp: 100 });
    report(
      measure(`orthogonal decomposition of ${n} x 3 by mathjs`, () => qr(rows), { runs: 30 }),
      own,
    );
  }
}
