import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { CONCENTRATION_UNIT_NAMES, convertConcentration } from '@/lib/engine';
import { log10, mean, median, std } from '@/lib/engine/math';
import { unit } from '@/lib/engine/matrices';
import { expectDigits } from '../../../support/digits';

test('the instance has the functions the engine uses', () => {
  expect(log10(0.001)).toBe(-3);
  expect([mean([1, 2, 6]), median([1, 9, 2]), Number(std([1, 3]))]).toEqual([3, 2, Math.SQRT2]);
});

describe('our units', () => {
  // Second opinion: mathjs, which writes the micro sign as u.
  const spelled = (name: string) => name.replace('µ', 'u');
  const pairs = CONCENTRATION_UNIT_NAMES.flatMap((from) =>
    CONCENTRATION_UNIT_NAMES.map((to) => [from, to] as const),
  );
  const alike = pairs.filter(([from, to]) => from.includes('mol') === to.includes('mol'));
  test.each(alike)('%s to %s agrees with mathjs', (from, to) => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (value) => {
        expectDigits(
          convertConcentration(value, from, to),
          unit(value, spelled(from)).toNumber(spelled(to)),
          14,
        );
      }),
      { seed: 20270114, numRuns: 20 },
    );
  });

  test('keep the digit that mathjs loses', () => {
    expect(unit(0.1, 'ug/mL').toNumber('mg/L')).not.toBe(0.1);
    expect(convertConcentration(0.1, 'µg/mL', 'mg/L')).toBe(0.1);
  });
});
