import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type FlagCode, FLAGS } from '@/lib/engine';
import { flag } from '@/lib/engine/flags';
import { request, standardsOf, unknown } from './requests';

/** Each flag with a request that raises it and one just on the other side of its limit. */
const CASES: Partial<Record<FlagCode, readonly [Partial<CurveRequest>, Partial<CurveRequest>]>> = {
  READING_OVER_LIMIT: [
    { absorbanceLimit: 0.5, unknowns: [unknown([0.4999, 0.5001])] },
    { absorbanceLimit: 0.5, unknowns: [unknown([0.4999, 0.5])] },
  ],
  READING_CENSORED: [{ unknowns: [unknown([0.4, '>3.5'])] }, { unknowns: [unknown([0.4, ''])] }],
  READING_WITHOUT_NUMBER: [{ unknowns: [unknown(['', 'lamp'])] }, { unknowns: [unknown(['', 0.4])] }],
  READING_LEFT_OUT: [{ unknowns: [unknown(['', 0.4])] }, { unknowns: [unknown([0.4, 0.4])] }],
  READING_NEGATIVE: [{ unknowns: [unknown([-0.01])] }, { unknowns: [unknown([-0.0001])] }],
  REPLICATES_APART: [
    { replicateLimit: 0.01, unknowns: [unknown([0.4, 0.4101])] },
    { replicateLimit: 0.01, unknowns: [unknown([0.4, 0.4099])] },
  ],
  OVER_TOP_STANDARD: [{ unknowns: [unknown([0.81])] }, { unknowns: [unknown([0.8])] }],
  UNDER_LOWEST_STANDARD: [{ unknowns: [unknown([0.08])] }, { unknowns: [unknown([0.105])] }],
  NOT_DETECTED: [{ unknowns: [unknown([0.005])] }, { unknowns: [unknown([0.08])] }],
  VALUE_UNDER_CRITICAL: [
    { standards: standardsOf([0.1, 2, 4, 6], [0.005, 0.23, 0.37, 0.61]), unknowns: [unknown([0.025])] },
    { standards: standardsOf([0.1, 2, 4, 6], [0.005, 0.23, 0.37, 0.61]), unknowns: [unknown([0.4])] },
  ],
  CELL_WITHOUT_U: [
    { unknowns: [unknown([0.4], { pathLengthMm: 20 })] },
    { unknowns: [unknown([0.4], { pathLengthMm: 20, pathLengthUMm: 0.02 })] },
  ],
  FEW_DEGREES_OF_FREEDOM: [
    { standards: standardsOf([1, 2, 3, 4], [0.1, 0.21, 0.3, 0.4]) },
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.21, 0.3, 0.4, 0.5]) },
  ],
  NO_SCATTER: [
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.2, 0.3, 0.4, 0.5]) },
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.2, 0.3, 0.4, 0.5001]) },
  ],
  SLOPE_NEGATIVE: [
    { standards: standardsOf([1, 2, 3, 4, 5], [0.5, 0.41, 0.3, 0.2, 0.1]) },
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.21, 0.3, 0.4, 0.5]) },
  ],
  SLOPE_LOOSE: [
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.25, 0.27, 0.42, 0.49]) },
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.21, 0.29, 0.4, 0.5]) },
  ],
  SLOPE_NOT_PROVEN: [
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.5, 0.2, 0.4, 0.25]) },
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.25, 0.27, 0.42, 0.49]) },
  ],
  INTERCEPT_NOT_ZERO: [
    { model: 'proportional', standards: standardsOf([1, 2, 3, 4, 5], [0.15, 0.251, 0.35, 0.449, 0.55]) },
    { model: 'proportional', standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.202, 0.299, 0.4, 0.501]) },
  ],
  ZERO_STANDARD_WITH_SUBTRACT: [
    {
      blank: { use: 'subtract', readings: [0.004] },
      standards: standardsOf([0, 1, 2, 3], [0.005, 0.1, 0.21, 0.3]),
    },
    {
      blank: { use: 'level', readings: [0.004] },
      standards: standardsOf([0, 1, 2, 3], [0.005, 0.1, 0.21, 0.3]),
    },
  ],
  ZERO_STANDARD_LEFT_OUT: [
    { weighting: '1/x', standards: standardsOf([0, 1, 2, 3], [0.005, 0.1, 0.21, 0.3]) },
    { weighting: 'none', standards: standardsOf([0, 1, 2, 3], [0.005, 0.1, 0.21, 0.3]) },
  ],
  STANDARD_LEFT_OUT: [
    { standards: request().standards.map((s, i) => (i === 4 ? { ...s, excluded: true } : s)) },
    { standards: request().standards.map((s, i) => (i === 4 ? { ...s, excluded: false } : s)) },
  ],
  STANDARD_CENSORED: [
    { standards: [...request().standards, { concentration: 50, readings: ['OVER'] }] },
    { standards: [...request().standards, { concentration: 50, readings: ['OVER'], excluded: true }] },
  ],
  STANDARD_OVER_LIMIT: [{ absorbanceLimit: 0.805 }, { absorbanceLimit: 0.8052 }],
  STANDARD_BACK_CALCULATES_OFF: [
    { standards: standardsOf([1, 2, 4, 6, 8], [0.1, 0.25, 0.4, 0.6, 0.8]) },
    { standards: standardsOf([1, 2, 4, 6, 8], [0.1, 0.21, 0.4, 0.6, 0.8]) },
  ],
  CRITICAL_OVER_LOWEST: [
    { standards: standardsOf([0.1, 2, 4, 6], [0.005, 0.23, 0.37, 0.61]) },
    { standards: standardsOf([2, 4, 6, 8], [0.2, 0.401, 0.6, 0.8]) },
  ],
  INFLUENTIAL_POINT: [
    { standards: standardsOf([1, 2, 3, 4, 20], [0.1, 0.21, 0.29, 0.4, 2.3]), absorbanceLimit: 3 },
    { standards: standardsOf([1, 2, 3, 4, 5], [0.1, 0.202, 0.298, 0.401, 0.5]) },
  ],
};

function codesOf(changes: Partial<CurveRequest>): readonly FlagCode[] {
  const { curve, unknowns } = calculateStandardCurve(request(changes));
  return [...curve.flags, ...unknowns.flatMap((result) => result.flags)].map((flag) => flag.code);
}

describe.each(Object.entries(CASES))('%s', (code, [raised, quiet]) => {
  test('is raised beyond its limit and not before', () => {
    expect(codesOf(raised)).toContain(code);
    expect(codesOf(quiet)).not.toContain(code);
  });

  test('says what and what to do, from its numbers', () => {
    const { curve, unknowns } = calculateStandardCurve(request(raised));
    const all = [...curve.flags, ...unknowns.flatMap((result) => result.flags)];
    const flag = all.find((item) => item.code === code);
    expect(flag?.level).toBe(FLAGS[code as FlagCode].level);
    expect(flag?.message).not.toMatch(/undefined|NaN|unknown amount|Infinity/);
    expect(flag?.message.split(/[.:;?] /).length).toBeGreaterThan(1);
    expect(flag?.message).toMatch(/\.$/);
  });
});

describe('the catalogue', () => {
  const QUADRATIC_AND_TESTS = ['CURVE_GIVES_NO_ROOT', 'LACK_OF_FIT', 'CURVATURE', 'VARIANCE_UNEVEN'];
  // Raised, and met on both sides of their limits, in the tests of direct/ and limits/.
  const WITHOUT_A_CURVE = [
    'READING_WITHOUT_U',
    'PATH_WITHOUT_U',
    'ABSORPTIVITY_WITHOUT_U',
    'ABSORPTIVITY_WITHOUT_CONDITIONS',
    'FAR_FROM_STANDARD',
    'STANDARD_DRIFTED',
    'MDL_DESIGN',
    'MDL_SPIKE_LEVEL',
  ];
  test('has a case for every flag', () => {
    const elsewhere = [...QUADRATIC_AND_TESTS, ...WITHOUT_A_CURVE];
    const missing = Object.keys(FLAGS).filter((code) => !(code in CASES) && !elsewhere.includes(code));
    expect(missing).toEqual([]);
  });

  test('has codes in upper snake and a meaning for each', () => {
    for (const [code, kind] of Object.entries(FLAGS)) {
      expect(code).toMatch(/^[A-Z]+(_[A-Z]+)*$/);
      expect(kind.meaning.length).toBeGreaterThan(10);
    }
  });
});

// A text made from fewer numbers than it could have still reads as a sentence.
test.each(Object.keys(FLAGS) as FlagCode[])('%s says something without its numbers', (code) => {
  const { message } = flag(code);
  expect(message).toMatch(/[.?]$|:$/);
  expect(message).not.toMatch(/undefined|NaN/);
});
