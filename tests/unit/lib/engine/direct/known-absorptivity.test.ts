import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type KnownAbsorptivityRequest, resultFromKnownAbsorptivity } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';

const SOURCE = 'handbook of absorptivities, table 3';

function ask(changes: Partial<KnownAbsorptivityRequest> = {}): KnownAbsorptivityRequest {
  return {
    signal: 'absorbance',
    pathLengthMm: 10,
    pathLengthUMm: 0.02,
    unit: 'mol/L',
    confidence: 0.95,
    absorbanceLimit: 2,
    absorptivity: { kind: 'molar', value: 6220, u: 30, source: SOURCE, conditions: '340 nm, pH 7, 25 C' },
    unknowns: [{ readings: [0.622, 0.624, 0.62] }],
    ...changes,
  };
}
function read(changes: Partial<KnownAbsorptivityRequest> = {}) {
  const [result] = resultFromKnownAbsorptivity(ask(changes)).unknowns;
  if (!result) throw new Error('no result');
  return result;
}
const codes = (result: { flags: readonly { code: string }[] }) => result.flags.map((flag) => flag.code);

describe('a result by a known absorptivity', () => {
  // By hand: c = 0.622 / 6220 = 1.0000e-4 mol/L; s = 0.002 with 2 degrees of freedom.
  test('is A over absorptivity and path, with a line for each', () => {
    const result = read();
    expectDigits(result.concentration?.value ?? NaN, 1e-4, 13);
    expect(result.budget.map((line) => line.source)).toEqual(['readings', 'absorptivity', 'path length']);
    const readings = 0.002 / Math.sqrt(3) / 0.622;
    const relative = Math.hypot(readings, 30 / 6220, 0.002);
    expectDigits(result.concentration?.u ?? NaN, 1e-4 * relative, 12);
    // Welch-Satterthwaite with one component of 2 degrees of freedom.
    expectDigits(result.concentration?.degreesOfFreedom ?? NaN, (2 * relative ** 4) / readings ** 4, 10);
    expectDigits(
      result.concentration?.U ?? NaN,
      (result.concentration?.k ?? NaN) * (result.concentration?.u ?? NaN),
      15,
    );
    expect(result.report).toBe('(1.000 ± 0.011) × 10^-4 mol/L');
    expect(result.reportCase).toBe('value');
    expect(result.fieller).toBeNull();
    expect(result.criticalValue).toBeNull();
    expectDigits(result.transmittance ?? NaN, 10 ** -0.622, 13);
    expect(codes(result)).toEqual([]);
  });

  // Molar absorptivity 43824 and relative molecular mass 66463 of serum albumin give E(1 %, 1 cm) 6.594 (encyclopedia).
  test('by molar absorptivity and by E(1 %, 1 cm) of one substance is the same', () => {
    const percent = (10 * 43824) / 66463;
    expect(percent.toFixed(3)).toBe('6.594');
    const of = (
      kind: 'molar' | 'percent' | 'specific',
      value: number,
      unit: KnownAbsorptivityRequest['unit'],
    ) =>
      read({ unit, formulaMass: 66463, absorptivity: { kind, value, u: value / 100, source: SOURCE } })
        .concentration;
    const grams = of('percent', percent, 'g/L');
    // 0.622 / 6.594 per cent is 0.0943 g in 100 mL.
    expectDigits(grams?.value ?? NaN, (10 * 0.622) / percent, 13);
    for (const [kind, value] of [
      ['molar', 43824],
      ['specific', percent / 10],
    ] as const)
      expectDigits(of(kind, value, 'g/L')?.value ?? NaN, grams?.value ?? NaN, 13);
    expectDigits(of('percent', percent, 'mmol/L')?.value ?? NaN, (0.622 / 43824) * 1000, 13);
    expectDigits(of('percent', percent, 'mmol/L')?.u ?? NaN, of('molar', 43824, 'mmol/L')?.u ?? NaN, 12);
  });

  test('follows path, blank, dilution and recovery', () => {
    const result = read({
      pathLengthMm: 20,
      blank: { readings: [0.0215, 0.022, 0.0225] },
      recovery: { value: 0.8, u: 0.01 },
      unknowns: [{ readings: [0.722], dilution: [{ takenMl: 5, toMl: 50, takenUMl: 0.01 }] }],
      readingSd: 0.001,
    });
    // (0.722 - 0.022) × 10/20 / 6220 × 10 / 0.8
    expectDigits(result.concentration?.value ?? NaN, ((0.7 / 2 / 6220) * 10) / 0.8, 13);
    expect(result.budget.map((line) => line.source)).toEqual([
      'readings',
      'blank',
      'absorptivity',
      'dilution 1, volume taken',
      'recovery',
      'path length',
    ]);
    const c = result.concentration?.value ?? NaN;
    const u = (source: string) => result.budget.find((line) => line.source === source)?.u ?? NaN;
    expectDigits(u('readings'), (c * 0.001) / 0.7, 12);
    expectDigits(u('blank'), (c * 0.001) / Math.sqrt(3) / 0.7, 12);
    expectDigits(u('recovery'), (c * 0.01) / 0.8, 12);
    expectDigits(result.measured?.value ?? NaN, 0.35 / 6220, 13);
    expect(result.concentration?.degreesOfFreedom).toBeNull();
  });

  // Independent differentiation: move the blank, the unknown and the absorptivity by hand.
  test('has the sensitivities that moving the inputs shows', () => {
    const at = (d: number) => read({ blank: { readings: [0.02 + d, 0.022 + d] } });
    const step = 1e-6;
    const difference = ((at(step).computed ?? NaN) - (at(-step).computed ?? NaN)) / (2 * step);
    expectDigits(at(0).budget.find((line) => line.source === 'blank')?.sensitivity ?? NaN, difference, 7);
  });

  test('in several blanked cells names the blank of each', () => {
    const result = read({
      blank: { readings: [0.02, 0.022], otherPaths: [{ pathLengthMm: 50, readings: [0.05, 0.053] }] },
      unknowns: [{ readings: [1.5, 1.51], pathLengthMm: 50, pathLengthUMm: 0.1 }],
    });
    expect(result.budget.map((line) => line.source)).toContain('blank at 50 mm');
    expect(result.budget.map((line) => line.source)).not.toContain('blank at 10 mm');
  });

  test('scales with unit and factor exactly', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 1.9, noNaN: true }), (a) => {
        const unknowns = [{ readings: [a, a + 0.001] }];
        const molar = read({ unknowns }).concentration;
        const micro = read({ unknowns, unit: '\u00b5mol/L' }).concentration;
        expectDigits(micro?.value ?? NaN, (molar?.value ?? NaN) * 1e6, 13);
        expectDigits(micro?.U ?? NaN, (molar?.U ?? NaN) * 1e6, 13);
      }),
    );
  });
});

describe('the report of a known absorptivity', () => {
  test('stops above the absorbance limit and above the range, with advice', () => {
    const over = read({ unknowns: [{ readings: [2.4] }] });
    expect(over.concentration).toBeNull();
    expect(over.reportCase).toBe('notQuantified');
    expect(over.report).toBe('not quantified: dilute at least 1 in 4 (1 part made up to 4), then read again');
    expect(codes(over)).toContain('READING_OVER_LIMIT');
    const censored = read({ unknowns: [{ readings: ['OVER'], wingEstimate: 2e-3 }] });
    expect(censored.advice).toMatch(/wing/);
    expect(censored.measured).toBeNull();
    expect(censored.budget).toEqual([]);
    expect(read({ unknowns: [{ readings: ['?'] }] }).report).toBe('not quantified: read again');
  });

  // By hand: t(0.95; 2) = 2.919986; s of the blank 0.002, one reading, three blanks.
  test('knows a critical value from the scatter of the blank', () => {
    const result = read({
      blank: { readings: [0.02, 0.022, 0.024] },
      unknowns: [{ name: 'low', readings: [0.024] }],
    });
    const critical = (2.91998558 * 0.002 * Math.sqrt(1 + 1 / 3)) / 6220;
    expectDigits(result.criticalValue ?? NaN, critical, 8);
    expect(result.reportCase).toBe('belowCriticalValue');
    expect(result.report).toBe('< 0.000001084 mol/L');
    expect(codes(result)).toEqual(['NOT_DETECTED', 'READING_WITHOUT_U']);
    // With a stated standard deviation the normal 1.644854.
    const stated = read({ readingSd: 0.001, unknowns: [{ readings: [0.001] }] });
    expectDigits(stated.criticalValue ?? NaN, (1.6448536269514722 * 0.001) / 6220, 12);
  });

  test('says not detected below zero when nothing is known of the scatter', () => {
    const result = read({ unknowns: [{ readings: [-0.003] }] });
    expect(result.report).toBe('not detected');
    expect(result.concentration).toBeNull();
    expect(result.computed).toBeLessThan(0);
    expect(codes(result)).toEqual(['READING_NEGATIVE', 'READING_WITHOUT_U']);
  });
});

describe('flags of a known absorptivity', () => {
  test('what has no uncertainty, no conditions, no scatter', () => {
    const answer = resultFromKnownAbsorptivity(
      ask({
        pathLengthUMm: 0,
        absorptivity: { kind: 'molar', value: 6220, u: 0, source: SOURCE },
        unknowns: [{ readings: [0.5] }],
      }),
    );
    expect(codes(answer)).toEqual(['ABSORPTIVITY_WITHOUT_U', 'ABSORPTIVITY_WITHOUT_CONDITIONS']);
    expect(answer.basis).toBe(`molar absorptivity 6220 L/(mol cm) (${SOURCE})`);
    const [result] = answer.unknowns;
    expect(codes(result ?? { flags: [] })).toEqual(['READING_WITHOUT_U', 'PATH_WITHOUT_U']);
    expect(result?.concentration?.u).toBe(0);
    expect(result?.working.find((step) => step.id === 'unknown.u')?.value).toBe(0);
    const { pathLengthUMm: _, ...unsaid } = ask();
    expect(codes(resultFromKnownAbsorptivity(unsaid).unknowns[0] ?? { flags: [] })).toEqual([
      'PATH_WITHOUT_U',
    ]);
    // Another cell has another uncertainty, and none was given for it.
    expect(codes(read({ unknowns: [{ readings: [0.9, 0.91], pathLengthMm: 20 }] }))).toContain(
      'PATH_WITHOUT_U',
    );
  });

  test('blank readings further apart than the stated scatter explains', () => {
    const answer = resultFromKnownAbsorptivity(
      ask({ readingSd: 0.001, blank: { readings: [0.02, 0.022, 0.024] } }),
    );
    expect(codes(answer)).toEqual(['REPLICATES_APART']);
  });

  // Studentized range q(0.95; 3, infinite) is 3.314 (tables): 0.001 allows a range of 0.0033.
  test('replicates further apart than the stated scatter explains', () => {
    const apart = read({ readingSd: 0.001, unknowns: [{ readings: [0.62, 0.63, 0.625] }] });
    expect(codes(apart)).toEqual(['REPLICATES_APART']);
    expect(apart.flags[0]?.limit?.toFixed(5)).toBe('0.00331');
    expectDigits(apart.budget[0]?.inputU ?? NaN, 0.005 / Math.sqrt(3), 12);
    expect(apart.budget[0]?.degreesOfFreedom).toBe(2);
    const within = read({ readingSd: 0.001, unknowns: [{ readings: [0.62, 0.622, 0.621] }] });
    expect(codes(within)).toEqual([]);
    expectDigits(within.budget[0]?.inputU ?? NaN, 0.001 / Math.sqrt(3), 12);
    // Five readings, one apart: the range fails while their own standard deviation is still smaller.
    const small = read({
      readingSd: 0.001,
      unknowns: [{ readings: [0.62, ...Array<number>(18).fill(0.62255), 0.6251] }],
    });
    expect(codes(small)).toEqual(['REPLICATES_APART']);
    expect(small.budget[0]?.degreesOfFreedom).toBeNull();
  });
});

describe('a call that cannot be calculated', () => {
  const absorptivity = ask().absorptivity;
  test.each<[string, string, Partial<KnownAbsorptivityRequest>]>([
    ['ABSORPTIVITY_NOT_POSITIVE', '/absorptivity/value', { absorptivity: { ...absorptivity, value: 0 } }],
    ['UNCERTAINTY_NEGATIVE', '/absorptivity/u', { absorptivity: { ...absorptivity, u: -1 } }],
    ['SOURCE_MISSING', '/absorptivity/source', { absorptivity: { ...absorptivity, source: ' ' } }],
    ['UNKNOWN_CHOICE', '/absorptivity/kind', { absorptivity: { ...absorptivity, kind: 'x' as 'molar' } }],
    ['FORMULA_MASS_MISSING', '/formulaMass', { unit: 'mg/L' }],
    ['FORMULA_MASS_NOT_POSITIVE', '/formulaMass', { formulaMass: 0 }],
    ['UNKNOWN_CHOICE', '/unit', { unit: 'ppm' as 'mg/L' }],
    ['UNKNOWN_CHOICE', '/signal', { signal: 'x' as 'absorbance' }],
    ['CONFIDENCE_OUT_OF_RANGE', '/confidence', { confidence: 1 }],
    ['NO_READINGS', '/blank/readings', { blank: { readings: [] } }],
    ['NO_READINGS', '/unknowns/0/readings', { unknowns: [{ readings: [] }] }],
    ['UNCERTAINTY_NEGATIVE', '/readingSd', { readingSd: -1 }],
    ['RECOVERY_NOT_POSITIVE', '/recovery/value', { recovery: { value: -1, u: 0 } }],
  ])('%s at %s', (code, pointer, changes) => {
    expect(() => read(changes)).toThrow(expect.objectContaining({ code, pointer }));
  });
});
