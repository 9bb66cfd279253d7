import { describe, expect, test } from 'vitest';
import { CONCENTRATION_UNIT_NAMES, convertConcentration, isMolar, parseUnit } from '@/lib/engine';
import { expectDigits } from '../../../support/digits';

describe('units', () => {
  test('the micro sign is U+00B5 in every unit, and Greek mu is taken for it', () => {
    expect(CONCENTRATION_UNIT_NAMES.join('')).not.toContain('\u03bc');
    expect(parseUnit('\u03bcmol/L')).toBe('\u00b5mol/L');
    expect(parseUnit(' \u00b5g/mL ')).toBe('\u00b5g/mL');
    expect(parseUnit('ppm')).toBeNull();
    expect(parseUnit('toString')).toBeNull();
  });

  test('knows which are molar', () => {
    expect(CONCENTRATION_UNIT_NAMES.filter(isMolar)).toEqual(['mol/L', 'mmol/L', '\u00b5mol/L']);
  });

  // Iron, 55.845 g/mol (IUPAC): 55.845 mg/L is 1 mmol/L.
  test('converts within and between mass and amount', () => {
    expectDigits(convertConcentration(55.845, 'mg/L', 'mmol/L', 55.845), 1, 15);
    expectDigits(convertConcentration(1, 'mmol/L', 'g/L', 55.845), 0.055845, 15);
    expect(convertConcentration(3, 'mg/L', '\u00b5g/mL')).toBe(3);
    expect(convertConcentration(2, 'mol/L', '\u00b5mol/L')).toBeCloseTo(2e6, 6);
  });

  test('refuses mass to amount without a formula mass', () => {
    expect(() => convertConcentration(1, 'mg/L', 'mol/L')).toThrow(
      expect.objectContaining({ code: 'FORMULA_MASS_MISSING' }),
    );
  });
});
