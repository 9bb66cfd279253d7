import {
  create,
  type FactoryFunctionMap,
  log10Dependencies,
  meanDependencies,
  medianDependencies,
  stdDependencies,
} from 'mathjs/number';

/*
 * The engine's one instance of mathjs: logarithms and statistics, for plain numbers. Of the whole package (190 kB
 * packed, with big numbers, units and matrices) these take 23 kB, so a page that calculates live loads no more.
 *
 * Not from here:
 * - Orthogonal decomposition (regression/qr.ts is our own). mathjs builds all of Q, n by n: 0.1 ms for 12 points of a
 *   quadratic, 200 times ours, and 12 ms for 200 points, 2,000 times ours (`npm run bench` prints both). It agrees with
 *   ours to 12 digits; a test asks it for its opinion (matrices.ts).
 * - Units (units.ts is our own). mathjs turns 0.1 ug/mL into 0.10000000000000003 mg/L, does not know the micro sign,
 *   and costs 50 kB more; the factors of our six units are exact, and a test compares them with it.
 * - Sums of weighted fits (regression/fit.ts): mathjs has no weighted sums, and its typed functions cost 3 to 8 µs a
 *   call, as much as a whole fit of 12 points.
 */
export const { log10, mean, median, std } = create({
  log10Dependencies,
  meanDependencies,
  medianDependencies,
  stdDependencies,
  // The package types each member as perhaps missing, which create() then does not take.
} as FactoryFunctionMap);
