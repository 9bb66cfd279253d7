import { evaluate } from 'mathjs';
import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest } from '@/lib/engine';
import { request, unknown } from '../requests';
import { expectOrdered } from './expect-ordered';

const UNKNOWNS = [unknown([0.351, 0.3523], { weight: 2 })];
const bent = [0.5, 1, 2, 4, 6, 8].map((c, i) => ({
  concentration: c,
  readings: [
    0.1 * c - 0.001 * c * c + 0.0004 * (i % 2),
    0.1 * c - 0.001 * c * c + 0.0007,
    0.1 * c - 0.001 * c * c,
    0.1 * c - 0.001 * c * c - 0.0003,
  ],
  weight: 1 / c,
}));

const CONFIGURATIONS: Readonly<Record<string, CurveRequest>> = {
  'a quadratic with its molar absorptivity': request({
    model: 'quadratic',
    standards: bent,
    unit: 'mmol/L',
    formulaMass: 50,
    unknowns: UNKNOWNS,
  }),
  'a weighted quadratic in several cells': request({
    model: 'quadratic',
    weighting: '1/y',
    standards: bent.map((standard, i) => ({ ...standard, pathLengthMm: i === 5 ? 5 : 10 })),
    unknowns: UNKNOWNS,
  }),
  'given weights': request({ weighting: 'given', standards: bent, unknowns: UNKNOWNS }),
  'weights of replicates': request({ weighting: 'replicates', standards: bent, unknowns: UNKNOWNS }),
  'weights 1/y2 through zero': request({
    weighting: '1/y2',
    model: 'proportional',
    standards: bent,
    unknowns: UNKNOWNS,
  }),
  'equal weights of several cells': request({
    standards: bent.map((standard, i) => ({ ...standard, pathLengthMm: i === 5 ? 5 : 10 })),
    unknowns: UNKNOWNS,
  }),
  'two wavelengths in absorbance': request({ unknowns: [unknown([{ main: 0.36, minus: 0.01 }])] }),
  'per cent, blank level, censored': request({
    signal: 'percentTransmittance',
    blank: { readings: [99.6, 99.8], use: 'level' },
    standards: [
      { concentration: 1, readings: [79, 78.8] },
      { concentration: 2, readings: [63, { main: 62, minus: 99 }] },
      { concentration: 4, readings: [39.7, 39.9] },
      { concentration: 8, readings: [15.8, 'OVER'] },
    ],
    unknowns: [
      unknown([
        { main: 30, minus: 98 },
        { main: 0, minus: 98 },
      ]),
    ],
  }),
};

describe.each(Object.entries(CONFIGURATIONS))('the working of %s', (_name, asked) => {
  const { curve, unknowns } = calculateStandardCurve(asked);
  const steps = [...curve.working, ...(unknowns[0]?.working ?? [])];

  test('names only lines that stand before, each once', () => {
    expectOrdered(steps);
  });

  test('works out line by line', () => {
    const calculated = steps.filter(
      (line) => line.formula.startsWith(`${line.symbol} = `) && typeof line.value === 'number',
    );
    for (const step of calculated) {
      const worked = Number(
        evaluate(step.substituted.slice(step.symbol.length + 3).replace(/ \+ \.\.\. .*? \.\.\./, '')),
      );
      const value = Number(step.value);
      expect(Math.abs(worked - value), step.id).toBeLessThanOrEqual(2e-3 * Math.abs(value) + 1e-12);
    }
  });
});
