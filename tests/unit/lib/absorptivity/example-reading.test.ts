import { describe, expect, test } from 'vitest';
import { exampleOfTexts, exampleSentence } from '@/lib/absorptivity/example-reading';
import { EMPTY_ABSORPTIVITY } from '@/lib/absorptivity/form-start';

const FERROIN: Parameters<typeof exampleSentence>[0] = {
  kind: 'molar',
  value: 11100,
  u: 100,
  unit: 'mg/L',
  formulaMass: 55.845,
  basis: 'Fe',
  pathLengthMm: 10,
  pathLengthUMm: null,
};

describe('what A = 0.5 would mean', () => {
  test('by ε of ferroin, 11 100 L/(mol cm) (textbooks, from memory): 0.1988 a mg/L', () => {
    // 0.5 / 11100 · 55.845 · 1000 = 2.5155; u by 100/11100 of it = 0.0227
    expect(exampleSentence(FERROIN)).toBe(
      'A = 0.5 in 10 mm would mean 2.516 mg/L as Fe, with u = 0.023 mg/L from the absorptivity and the path; 1 mg/L reads A = 0.1988.',
    );
  });
  test('the path divides, and its uncertainty comes in', () => {
    // u² = 0.0227² + (0.02/20 · ½)² of half the value: 0.00113² + 0.0113²
    expect(exampleSentence({ ...FERROIN, pathLengthMm: 20, pathLengthUMm: 0.02 })).toContain(
      'in 20 mm would mean 1.258 mg/L as Fe, with u = 0.011 mg/L',
    );
  });
  test('without an uncertainty says so', () => {
    expect(exampleSentence({ ...FERROIN, u: null })).toContain(
      '2.516 mg/L as Fe, with no uncertainty stated;',
    );
  });
  test('by E(1 %, 1 cm) 530 of tartrazine at 426 nm (EU 231/2012, from memory): 10 · 0.5 / 530 g/L', () => {
    const tartrazine = {
      ...FERROIN,
      kind: 'percent',
      value: 530,
      u: null,
      formulaMass: null,
      basis: '',
    } as const;
    expect(exampleSentence(tartrazine)).toContain('would mean 9.434 mg/L, with');
  });
  test('by ε 6 220 of NADH at 340 nm (Horecker and Kornberg 1948, from memory) in mol/L, without a slope that nobody reads', () => {
    const nadh = { ...FERROIN, value: 6220, u: 30, unit: 'mol/L', formulaMass: null, basis: '' } as const;
    // 0.5 / 6220 = 8.039e-5 and 30/6220 of it
    expect(exampleSentence(nadh)).toBe(
      'A = 0.5 in 10 mm would mean 0.00008039 mol/L, with u = 3.9e-7 mol/L from the absorptivity and the path.',
    );
  });
});

describe('while it is typed', () => {
  test('says what is missing', () => {
    expect(exampleOfTexts(EMPTY_ABSORPTIVITY)).toMatch(/^Enter the absorptivity/);
    expect(exampleOfTexts({ ...EMPTY_ABSORPTIVITY, value: '11100' })).toMatch(/formula mass: enter it\.$/);
  });
  test('follows the texts, with a decimal comma too', () => {
    const texts = { ...EMPTY_ABSORPTIVITY, value: '11100', formulaMass: '55,8450', basis: 'Fe' };
    expect(exampleOfTexts(texts)).toContain('2.516 mg/L as Fe');
  });
});
