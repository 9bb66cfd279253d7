import { describe, expect, test } from 'vitest';
import { standardCurveCalculation } from '@/lib/schemas/calculation';
import { issuesOf } from '@/lib/schemas/issues';

const REQUEST = {
  signal: 'absorbance',
  unit: 'mg/L',
  model: 'linear',
  weighting: 'none',
  standards: [{ concentration: 1, readings: [0.2, '>3.5'] }],
};

const pointers = (body: unknown) => {
  const parsed = standardCurveCalculation.safeParse(body);
  return parsed.success ? [] : issuesOf(parsed.error).map(({ path }) => path.join('/'));
};

describe('standardCurveCalculation', () => {
  test('fills in what the contract gives a usual value, and nothing else', () => {
    expect(standardCurveCalculation.parse(REQUEST)).toEqual({
      ...REQUEST,
      pathLengthMm: 10,
      confidence: 0.95,
      absorbanceLimit: 2,
      unknowns: [],
    });
  });

  test('takes both micro signs and answers with U+00B5', () => {
    expect(standardCurveCalculation.parse({ ...REQUEST, unit: '\u03bcmol/L' }).unit).toBe('\u00b5mol/L');
  });

  test.each([
    [{ ...REQUEST, signal: 'colour' }, 'signal'],
    [{ ...REQUEST, unit: 'ppm' }, 'unit'],
    [{ ...REQUEST, standards: [{ concentration: '1', readings: [0.2] }] }, 'standards/0/concentration'],
    [{ ...REQUEST, standards: [{ concentration: 1, readings: [null] }] }, 'standards/0/readings/0'],
    [{ ...REQUEST, unknowns: [{ readings: [1], dilution: [{ takenMl: 1 }] }] }, 'unknowns/0/dilution/0/toMl'],
    [
      { ...REQUEST, unknowns: [{ readings: [1], dilution: [{ takenG: 1, toG: '2' }] }] },
      'unknowns/0/dilution/0/toG',
    ],
    [{ ...REQUEST, unknowns: [{ readings: [1], dilution: [7] }] }, 'unknowns/0/dilution/0'],
  ])('points at the value that is wrong: %#', (body, pointer) => {
    expect(pointers(body)).toEqual([pointer]);
  });

  test('a misspelt member is refused, not passed over', () => {
    expect(standardCurveCalculation.safeParse({ ...REQUEST, pathLenghtMm: 50 }).success).toBe(false);
  });
});
