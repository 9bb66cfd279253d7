import { describe, expect, test } from 'vitest';
import {
  type BracketingRequest,
  resultFromBracketing,
  resultFromSingleStandard,
  type SingleStandardRequest,
} from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';

const COMMON = {
  signal: 'absorbance',
  pathLengthMm: 10,
  unit: 'mg/L',
  confidence: 0.95,
  absorbanceLimit: 2,
} as const;

const single = (changes: Partial<SingleStandardRequest> = {}): SingleStandardRequest => ({
  ...COMMON,
  standard: { concentration: 5, readings: [0.5, 0.502, 0.498] },
  unknowns: [{ readings: [0.6, 0.602] }],
  ...changes,
});
const bracket = (changes: Partial<BracketingRequest> = {}): BracketingRequest => ({
  ...COMMON,
  low: { concentration: 4, readings: [0.41, 0.412, 0.408] },
  high: { concentration: 6, readings: [0.6, 0.603, 0.597] },
  unknowns: [{ readings: [0.5, 0.502] }],
  ...changes,
});
const codes = (of: { flags: readonly { code: string }[] } | undefined) => of?.flags.map((flag) => flag.code);

describe('a single standard', () => {
  // By hand: 5 × 0.601 / 0.5; relative parts of both mean readings and 0.4 % of the standard.
  test('compares by a line through zero', () => {
    const [result] = resultFromSingleStandard(single({ standardsRelativeU: 0.004 })).unknowns;
    const c = (5 * 0.601) / 0.5;
    expectDigits(result?.concentration?.value ?? NaN, c, 13);
    const relative = Math.hypot((Math.SQRT2 * 0.001) / Math.SQRT2 / 0.601, 0.002 / Math.sqrt(3) / 0.5, 0.004);
    expectDigits(result?.concentration?.u ?? NaN, c * relative, 12);
    expect(result?.budget.map((line) => line.source)).toEqual([
      'readings',
      'readings of the standard',
      'standards',
    ]);
    expect(codes(result)).toEqual([]);
  });

  // Independent: move the blank by hand; it moves the unknown and the standard together.
  test('lets a common blank move both', () => {
    const at = (d: number) =>
      resultFromSingleStandard(single({ blank: { readings: [0.01 + d, 0.012 + d] } })).unknowns[0];
    const step = 1e-6;
    const difference = ((at(step)?.computed ?? NaN) - (at(-step)?.computed ?? NaN)) / (2 * step);
    expectDigits(at(0)?.budget.find((line) => line.source === 'blank')?.sensitivity ?? NaN, difference, 6);
  });

  test('flags drift between before and after, and takes both into the mean', () => {
    const drifted = resultFromSingleStandard(
      single({ standard: { concentration: 5, readings: [0.5, 0.5], readingsAfter: [0.52] } }),
    );
    expect(codes(drifted)).toEqual(['STANDARD_DRIFTED']);
    expectDigits(drifted.flags[0]?.value ?? NaN, (100 * 0.02) / 0.51, 10);
    expectDigits(drifted.unknowns[0]?.concentration?.value ?? NaN, (5 * 0.601) / (1.52 / 3), 13);
    const steady = { concentration: 5, readings: [0.5, 0.502], readingsAfter: [0.503] };
    expect(codes(resultFromSingleStandard(single({ standard: steady })))).toEqual([]);
    expect(codes(resultFromSingleStandard(single({ standard: steady, driftLimit: 0.001 })))).toEqual([
      'STANDARD_DRIFTED',
    ]);
  });

  test('advises a dilution where a reading is too high', () => {
    const { unknowns } = resultFromSingleStandard(single({ unknowns: [{ readings: [2.2] }] }));
    expect(unknowns[0]?.report).toBe(
      'not quantified: dilute at least 1 in 4 (1 part made up to 4), then read again',
    );
  });

  test('flags a single reading and an unknown far away', () => {
    const answer = resultFromSingleStandard(
      single({
        standard: { concentration: 5, readings: [0.5] },
        unknowns: [{ readings: [1.1, 1.11] }, { readings: [0.2, 0.21] }, { readings: [-0.01, -0.011] }],
      }),
    );
    expect(codes(answer)).toEqual(['READING_WITHOUT_U']);
    expect(answer.unknowns.slice(0, 2).map(codes)).toEqual([['FAR_FROM_STANDARD'], ['FAR_FROM_STANDARD']]);
    expect(answer.unknowns[2]?.report).toBe('not detected');
    expect(answer.basis).toBe('one standard of 5 mg/L');
  });

  test('has lines for paths only in different cells', () => {
    const other = resultFromSingleStandard(
      single({
        pathLengthUMm: 0.02,
        unknowns: [{ readings: [1.2, 1.204], pathLengthMm: 20, pathLengthUMm: 0.1 }],
      }),
    ).unknowns[0];
    const c = other?.concentration?.value ?? NaN;
    expectDigits(
      other?.budget.find((line) => line.source === 'path length of the unknown')?.u ?? NaN,
      c * 0.005,
      12,
    );
    expectDigits(
      other?.budget.find((line) => line.source === 'path length of the standards')?.u ?? NaN,
      c * 0.002,
      12,
    );
    const unsure = resultFromSingleStandard(
      single({ unknowns: [{ readings: [1.2, 1.21], pathLengthMm: 20 }] }),
    );
    expect(codes(unsure.unknowns[0])).toEqual(['CELL_WITHOUT_U']);
  });

  test.each<[string, string, Partial<SingleStandardRequest>]>([
    ['CONCENTRATION_NEGATIVE', '/standard/concentration', { standard: { concentration: 0, readings: [1] } }],
    ['NO_READINGS', '/standard/readings', { standard: { concentration: 1, readings: [] } }],
    [
      'STANDARD_WITHOUT_NUMBER',
      '/standard/readings/1',
      { standard: { concentration: 1, readings: [1, 'OVER'] } },
    ],
    ['ZERO_SLOPE', '/standard/readings', { standard: { concentration: 1, readings: [0] } }],
    ['UNCERTAINTY_NEGATIVE', '/driftLimit', { driftLimit: -1 }],
    ['UNCERTAINTY_NEGATIVE', '/standardsRelativeU', { standardsRelativeU: -1 }],
  ])('refuses %s at %s', (code, pointer, changes) => {
    expect(() => resultFromSingleStandard(single(changes))).toThrow(
      expect.objectContaining({ code, pointer }),
    );
  });
});

describe('a bracket of two standards', () => {
  // By hand: 4 + (0.501 - 0.41) × 2 / 0.19.
  test('interpolates, with the readings of all three', () => {
    const [result] = resultFromBracketing(bracket()).unknowns;
    const c = 4 + (0.091 * 2) / 0.19;
    expectDigits(result?.concentration?.value ?? NaN, c, 13);
    const parts = [
      (0.001 * 2) / 0.19,
      ((0.002 / Math.sqrt(3)) * (6 - c)) / 0.19,
      ((0.003 / Math.sqrt(3)) * (c - 4)) / 0.19,
    ];
    expectDigits(result?.concentration?.u ?? NaN, Math.hypot(...parts), 12);
    expect(result?.budget.map((line) => line.source)).toEqual([
      'readings',
      'readings of the low standard',
      'readings of the high standard',
    ]);
  });

  test('a common blank cancels, as with any free intercept', () => {
    const withBlank = resultFromBracketing(bracket({ blank: { readings: [0.01, 0.014] } })).unknowns[0];
    const without = resultFromBracketing(bracket()).unknowns[0];
    expectDigits(withBlank?.concentration?.value ?? NaN, without?.concentration?.value ?? NaN, 12);
    expect(Math.abs(withBlank?.budget.find((line) => line.source === 'blank')?.u ?? 0)).toBeLessThan(1e-14);
  });

  test('claims nothing outside', () => {
    const { unknowns } = resultFromBracketing(
      bracket({ unknowns: [{ readings: [0.7, 0.702] }, { readings: [0.3, 0.301] }] }),
    );
    expect(unknowns[0]?.report).toBe('> 6 mg/L; dilute 1 in 2 (1 part made up to 2)');
    expect(unknowns[0]?.concentration).toBeNull();
    expect(codes(unknowns[0])).toEqual(['OVER_TOP_STANDARD']);
    expect(unknowns[1]?.reportCase).toBe('belowLowestStandard');
    expect(codes(unknowns[1])).toEqual(['UNDER_LOWEST_STANDARD']);
  });

  test('flags standards that scatter more than was stated', () => {
    expect(codes(resultFromBracketing(bracket({ readingSd: 0.001 })))).toEqual([
      'REPLICATES_APART',
      'REPLICATES_APART',
    ]);
  });

  test('flags standards read once', () => {
    const answer = resultFromBracketing(
      bracket({ low: { concentration: 0, readings: [0.01] }, high: { concentration: 6, readings: [0.6] } }),
    );
    expect(codes(answer)).toEqual(['READING_WITHOUT_U', 'READING_WITHOUT_U']);
    expect(answer.basis).toBe('two standards of 0 and 6 mg/L');
  });

  test.each<[string, string, Partial<BracketingRequest>]>([
    ['BRACKET_REVERSED', '/high/concentration', { high: { concentration: 4, readings: [0.6] } }],
    ['BRACKET_REVERSED', '/high/concentration', { low: { concentration: -1, readings: [0.6] } }],
    ['NOT_FINITE', '/low/concentration', { low: { concentration: NaN, readings: [0.6] } }],
    ['NO_READINGS', '/high/readings', { high: { concentration: 6, readings: [] } }],
    ['ZERO_SLOPE', '/high/readings', { high: { concentration: 6, readings: [0.41] } }],
  ])('refuses %s at %s', (code, pointer, changes) => {
    expect(() => resultFromBracketing(bracket(changes))).toThrow(expect.objectContaining({ code, pointer }));
  });
});
