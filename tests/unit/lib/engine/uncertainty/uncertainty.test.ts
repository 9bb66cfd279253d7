import { describe, expect, test } from 'vitest';
import { volumeUncertainty, type Ware } from '@/lib/engine';
import { coverageFactor, effectiveDegreesOfFreedom } from '@/lib/engine/uncertainty/expand';
import { expectDigits } from '../../../../support/digits';
import { reference } from '../requests';

describe('volumeUncertainty', () => {
  // Reference: EURACHEM/CITAC CG 4, example A1, unrounded (fixtures/reference/eurachem-cg4/SOURCE.md).
  test('agrees with the 100 mL flask of example A1', () => {
    const { A1 } = reference<{ A1: Ware & { volumeMl: number; u: number } }>('eurachem-cg4');
    expectDigits(volumeUncertainty(A1.volumeMl, A1), A1.u, 12);
  });

  test('is zero when nothing is known about the vessel', () => {
    expect(volumeUncertainty(100, {})).toBe(0);
  });
});

describe('effectiveDegreesOfFreedom', () => {
  // Reference: JCGM 100:2008 (GUM), G.4: 0.25 (9), 0.57 (4), 0.82 (14) give 19.0, k(95 %) 2.09.
  test('agrees with the example of GUM G.4', () => {
    const nu = effectiveDegreesOfFreedom(
      [
        { u: 0.25, degreesOfFreedom: 9 },
        { u: 0.57, degreesOfFreedom: 4 },
        { u: 0.82, degreesOfFreedom: 14 },
      ],
      1,
    );
    expect(nu.toFixed(1)).toBe('19.0');
    expect(coverageFactor(0.95, nu).toFixed(2)).toBe('2.09');
  });

  test('is infinite for Type B alone, and survives very small units', () => {
    expect(effectiveDegreesOfFreedom([{ u: 1e-100, degreesOfFreedom: Infinity }], 1)).toBe(Infinity);
    expect(effectiveDegreesOfFreedom([{ u: 1e-100, degreesOfFreedom: 7 }], 1)).toBe(7);
  });

  test('is that of the curve when nothing is uncertain', () => {
    expect(effectiveDegreesOfFreedom([{ u: 0, degreesOfFreedom: Infinity }], 5)).toBe(5);
  });
});
