import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { makings } from '@/lib/engine/dilution/glassware';
import { expectDigits } from '../../../../support/digits';
import { resultOf } from '../requests';

const OWNED = { pipettesMl: [1, 5, 10], flasksMl: [25, 50, 100] };

describe('what glassware makes', () => {
  // By hand: 25/10, 50/10, 100/10 = 25/5 ... each factor once, by the larger pipette.
  test('in one step', () => {
    const single = makings(OWNED).filter((way) => way.by?.length === 1);
    expect(single.map((way) => way.factor)).toEqual([2.5, 5, 10, 20, 25, 50, 100]);
    expect(single[1]?.by).toEqual([{ takenMl: 10, toMl: 50 }]);
  });

  test('in two where one does not', () => {
    const made = makings(OWNED).find((way) => way.factor === 1000);
    expect(made?.by?.length).toBe(2);
    expectDigits(made?.by?.reduce((f, { takenMl, toMl }) => (f * toMl) / takenMl, 1) ?? NaN, 1000, 14);
    expect(makings(OWNED).at(-1)?.factor).toBe(10000);
    expect(makings({ pipettesMl: [50], flasksMl: [10] })).toEqual([]);
  });

  test('keeps its order, without repeats', () => {
    const volume = fc.constantFrom(0.5, 1, 2, 3, 5, 10, 15, 20, 25, 50, 100, 250);
    fc.assert(
      fc.property(
        fc.array(volume, { maxLength: 6 }),
        fc.array(volume, { maxLength: 6 }),
        (pipettesMl, flasksMl) => {
          const factors = makings({ pipettesMl, flasksMl }).map((way) => way.factor);
          for (let i = 1; i < factors.length; i += 1)
            expect((factors[i] ?? 0) / (factors[i - 1] ?? 1)).toBeGreaterThan(1 + 1e-9);
        },
      ),
    );
  });
});

describe('advice', () => {
  test('is rounded to the glassware the laboratory owns and names it', () => {
    // 1.9 reads back near 19 mg/L, the middle of the curve near 4.5: 1 in 5 with this glassware.
    const result = resultOf([1.9], {}, { glassware: OWNED });
    expect(result.dilutionAdvice).toMatchObject({
      factor: 5,
      atLeast: false,
      by: [{ takenMl: 10, toMl: 50 }],
    });
    expect(result.advice).toBe('1 in 5 (10 mL made up to 50 mL)');
    expect(result.report).toBe('> 8 mg/L; dilute 1 in 5 (10 mL made up to 50 mL)');
  });

  test('falls back on the strongest, or on blind advice without any that dilutes', () => {
    const strongest = resultOf([1.9], {}, { glassware: { pipettesMl: [20], flasksMl: [25] } });
    expect(strongest.advice).toBe(
      'at least 1 in 1.5625 (20 mL made up to 25 mL, then 20 mL made up to 25 mL), then read again',
    );
    expect(resultOf([1.9], {}, { glassware: { pipettesMl: [], flasksMl: [] } }).advice).toBe(
      'at least 1 in 10, then read again',
    );
  });

  test('rests on the wing of the band where the reading says too little', () => {
    for (const readings of [['OVER'], [3.4], [2.6]]) {
      const result = resultOf(readings, { wingEstimate: 48 });
      expect(result.dilutionAdvice).toMatchObject({ factor: 10, fromWing: true, atLeast: false });
      expect(result.advice).toBe('1 in 10 (1 part made up to 10), as the wing of the band suggests');
      expect(result.concentration).toBeNull();
    }
    expect(resultOf(['OVER'], { wingEstimate: 1e7 }).advice).toBe(
      'at least 1 in 10000 (1 part made up to 10000), as the wing of the band suggests, then read again',
    );
  });

  test('needs no wing where the reading is good', () => {
    // 12 mg/L: halved it would read 0.604, above the 0.6 that a dilution aims at.
    expect(resultOf([1.2], { wingEstimate: 900 }).dilutionAdvice).toMatchObject({ factor: 4 });
    expect(resultOf([1.2], { wingEstimate: 900 }).dilutionAdvice?.fromWing).toBeUndefined();
  });
});
