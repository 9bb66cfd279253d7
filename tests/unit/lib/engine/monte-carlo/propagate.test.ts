import { describe, expect, test } from 'vitest';
import { propagate } from '@/lib/engine/monte-carlo/propagate';
import { randomOf } from '@/lib/engine/monte-carlo/random';
import type { Spread } from '@/lib/engine/uncertainty/spread';
import { expectDigits } from '../../../../support/digits';

const RUN = { trials: 400_000, seed: 20_080_901, confidence: 0.95 };
const sum = (x: Float64Array) => x.reduce((total, value) => total + value, 0);
const inputs = (...spreads: Spread[]) => spreads.map((spread) => ({ value: 0, spreads: [spread] }));
const rectangularOf = (sd: number): Spread => ({ shape: 'rectangular', halfWidth: sd * Math.sqrt(3) });

describe('JCGM 101:2008', () => {
  // 9.2.2: four standard normal inputs, 95 %: ±3.92, u 2.00.
  test('9.2.2, four normal inputs', () => {
    const run = propagate({
      ...RUN,
      inputs: inputs(...Array<Spread>(4).fill({ shape: 'normal', u: 1 })),
      model: sum,
    });
    expect(run.u.toFixed(2)).toBe('2.00');
    expect(Math.abs(run.interval[0] + 3.92)).toBeLessThan(0.03);
    expect(Math.abs(run.interval[1] - 3.92)).toBeLessThan(0.03);
    expect(Math.abs(run.mean)).toBeLessThan(0.01);
  });

  // 9.2.3: four rectangular inputs of standard deviation 1: ±3.88, exactly 2√3 (2 - 0.6^(1/4)).
  test('9.2.3, four rectangular inputs', () => {
    const run = propagate({ ...RUN, inputs: inputs(...Array<Spread>(4).fill(rectangularOf(1))), model: sum });
    const exact = 2 * Math.sqrt(3) * (2 - 0.6 ** 0.25);
    expect(exact.toFixed(2)).toBe('3.88');
    expect(run.u.toFixed(2)).toBe('2.00');
    for (const end of run.interval) expect(Math.abs(Math.abs(end) - exact)).toBeLessThan(0.02);
    expect(run.shortest[1] - run.shortest[0]).toBeLessThanOrEqual(run.interval[1] - run.interval[0]);
  });

  // 9.2.4 (typed from memory): the fourth ten times wider; u 10.1, ±17.0.
  test('9.2.4, one input dominant', () => {
    const run = propagate({
      ...RUN,
      inputs: inputs(rectangularOf(1), rectangularOf(1), rectangularOf(1), rectangularOf(10)),
      model: sum,
    });
    // Exactly √103 = 10.149.
    expect(Math.abs(run.u - Math.sqrt(103))).toBeLessThan(0.03);
    for (const end of run.interval) expect(Math.abs(Math.abs(end) - 17)).toBeLessThan(0.05);
  });

  // 9.3 mass calibration (typed from memory, recomputed independently): 1.2341, 0.0754, shortest [1.0834, 1.3825] mg.
  test('9.3, mass calibration', () => {
    const normal = (value: number, u: number) => ({ value, spreads: [{ shape: 'normal' as const, u }] });
    const between = (low: number, high: number) => ({
      value: (low + high) / 2,
      spreads: [{ shape: 'rectangular' as const, halfWidth: (high - low) / 2 }],
    });
    const run = propagate({
      ...RUN,
      inputs: [
        normal(1e5, 0.05),
        normal(1.234, 0.02),
        between(1.1, 1.3),
        between(7000, 9000),
        between(7950, 8050),
      ],
      model: ([mR = 0, dm = 0, air = 0, w = 0, r = 0]) =>
        (mR + dm) * (1 + (air - 1.2) * (1 / w - 1 / r)) - 1e5,
    });
    expect(Math.abs(run.mean - 1.2341)).toBeLessThan(5e-4);
    expect(Math.abs(run.u - 0.0754)).toBeLessThan(5e-4);
    expect(Math.abs(run.shortest[0] - 1.0834)).toBeLessThan(2e-3);
    expect(Math.abs(run.shortest[1] - 1.3825)).toBeLessThan(2e-3);
  });
});

describe('what is drawn', () => {
  const draws = (spread: Spread, trials = 200_000) =>
    propagate({ ...RUN, trials, inputs: [{ value: 0, spreads: [spread] }], model: ([x = 0]) => x });

  // Standard deviations by formula: a/√3, a/√6, u √(ν/(ν - 2)); t(0.975; 5) = 2.5706 (tables).
  test.each<[Spread, number, number]>([
    [{ shape: 'rectangular', halfWidth: 3 }, Math.sqrt(3), 3 * 0.95],
    [{ shape: 'triangular', halfWidth: 3 }, 3 / Math.sqrt(6), 3 * (1 - Math.sqrt(0.05))],
    [{ shape: 'normal', u: 2 }, 2, 2 * 1.95996],
    [{ shape: 't', u: 2, degreesOfFreedom: 5 }, 2 * Math.sqrt(5 / 3), 2 * 2.5706],
  ])('%j', (spread, sd, end) => {
    const run = draws(spread);
    expect(Math.abs(run.u / sd - 1)).toBeLessThan(0.015);
    for (const found of run.interval) expect(Math.abs(Math.abs(found) / end - 1)).toBeLessThan(0.015);
  });

  // t(0.975; 1) = 12.706 (tables): χ² of one degree of freedom is the hard case of its generator.
  test('t with one degree of freedom', () => {
    const [low, high] = draws({ shape: 't', u: 1, degreesOfFreedom: 1 }).interval;
    expect(Math.abs(-low / 12.706 - 1)).toBeLessThan(0.04);
    expect(Math.abs(high / 12.706 - 1)).toBeLessThan(0.04);
  });

  // Mean ν and variance 2ν of χ².
  test.each([1, 2, 3, 12])('χ² of %i degrees of freedom', (nu) => {
    const random = randomOf(7);
    const values = Array.from({ length: 100_000 }, () => random.chiSquare(nu));
    const mean = values.reduce((total, x) => total + x, 0) / values.length;
    const variance = values.reduce((total, x) => total + (x - mean) ** 2, 0) / values.length;
    expect(Math.abs(mean / nu - 1)).toBeLessThan(0.015);
    expect(Math.abs(variance / (2 * nu) - 1)).toBeLessThan(0.05);
  });

  test('is the same for the same seed, and other for another', () => {
    const spread = { shape: 'normal', u: 1 } as const;
    expect(draws(spread, 1000)).toEqual(draws(spread, 1000));
    const other = propagate({ ...RUN, seed: 1, trials: 1000, inputs: inputs(spread), model: sum });
    expect(other.mean).not.toBe(draws(spread, 1000).mean);
  });

  // First outputs for the state 1, 2, 3, 4 are known only with that state; here: bits are even, no value repeats early.
  test('is uniform to what 64 cells can tell', () => {
    const random = randomOf(0);
    const cells = new Array<number>(64).fill(0);
    const n = 640_000;
    for (let i = 0; i < n; i += 1) {
      const cell = Math.floor(64 * random.uniform());
      cells[cell] = (cells[cell] ?? 0) + 1;
    }
    const chi = cells.reduce((total, count) => total + (count - n / 64) ** 2 / (n / 64), 0);
    // χ²(63): 99.9 % at 103.4, 0.1 % at 32.3 (tables).
    expect(chi).toBeGreaterThan(32.3);
    expect(chi).toBeLessThan(103.4);
  });
});

test('trials without a result are counted and left out', () => {
  const run = propagate({
    ...RUN,
    trials: 10_000,
    inputs: inputs({ shape: 'rectangular', halfWidth: 1 }),
    model: ([x = 0]) => Math.sqrt(x),
  });
  expect(run.failed).toBeGreaterThan(4500);
  expect(run.failed).toBeLessThan(5500);
  expect(run.interval[0]).toBeGreaterThan(0);
  expect(Math.abs(run.mean - 2 / 3)).toBeLessThan(0.02);
});

test('a run of a few trials says that its ends are unknown', () => {
  const run = propagate({ ...RUN, trials: 15, inputs: inputs({ shape: 'normal', u: 1 }), model: sum });
  expect(run.intervalError).toEqual([Infinity, Infinity]);
  expectDigits(run.trials, 15, 15);
});
