import { evaluate } from 'mathjs';
import { describe, expect, test } from 'vitest';
import {
  type DirectAnswer,
  resultFromBracketing,
  resultFromKnownAbsorptivity,
  resultFromSingleStandard,
} from '@/lib/engine';
import { expectOrdered } from './expect-ordered';

const COMMON = { signal: 'transmittance', unit: 'mg/L', confidence: 0.95, absorbanceLimit: 2 } as const;
const UNKNOWNS = [
  {
    readings: [0.4, 0.402, 0.399],
    pathLengthMm: 20,
    pathLengthUMm: 0.03,
    dilution: [{ takenMl: 5, toMl: 50, takenUMl: 0.01 }],
    recovery: { value: 0.9, u: 0.01 },
  },
];
const BLANK = { readings: [0.99, 0.992], otherPaths: [{ pathLengthMm: 20, readings: [0.981, 0.983] }] };

const ANSWERS: Readonly<Record<string, DirectAnswer>> = {
  'a known absorptivity': resultFromKnownAbsorptivity({
    ...COMMON,
    pathLengthMm: 20,
    blank: { readings: [0.981, 0.983] },
    formulaMass: 55.845,
    absorptivity: { kind: 'molar', value: 11100, u: 60, source: 'paper' },
    unknowns: UNKNOWNS,
  }),
  'a single standard': resultFromSingleStandard({
    ...COMMON,
    pathLengthMm: 10,
    pathLengthUMm: 0.01,
    blank: BLANK,
    readingSd: 0.001,
    standard: { concentration: 5, readings: [0.4, 0.401], readingsAfter: [0.399] },
    standardsRelativeU: 0.004,
    unknowns: UNKNOWNS,
  }),
  'a bracket': resultFromBracketing({
    ...COMMON,
    pathLengthMm: 10,
    blank: BLANK,
    low: { concentration: 1, readings: [0.8, 0.802] },
    high: { concentration: 6, readings: [0.3] },
    unknowns: UNKNOWNS,
  }),
  'a reading without a number': resultFromBracketing({
    ...COMMON,
    pathLengthMm: 10,
    low: { concentration: 1, readings: [0.8, 0.802] },
    high: { concentration: 6, readings: [0.3] },
    unknowns: [{ readings: [0] }],
  }),
};

describe.each(Object.entries(ANSWERS))('the working of %s', (_name, answer) => {
  const steps = [...answer.working, ...(answer.unknowns[0]?.working ?? [])];

  test('names only lines that stand before, each once, and ends with the report', () => {
    expectOrdered(steps);
    expect(steps.at(-1)?.value).toBe(answer.unknowns[0]?.report);
  });

  test('works out line by line', () => {
    for (const step of steps.filter((line) => line.formula.startsWith(`${line.symbol} = `))) {
      const worked = Number(evaluate(step.substituted.slice(step.symbol.length + 3)));
      const value = Number(step.value);
      expect(Math.abs(worked - value), step.id).toBeLessThanOrEqual(2e-5 * Math.abs(value) + 1e-12);
    }
  });
});
