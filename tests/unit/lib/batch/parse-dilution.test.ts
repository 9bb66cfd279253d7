import { describe, expect, test } from 'vitest';
import { dilutionFactor, dilutionText } from '@/lib/batch/dilution-text';
import { parseDilution } from '@/lib/batch/parse-dilution';

function steps(text: string) {
  const parsed = parseDilution(text);
  if (!parsed.ok) throw new Error(parsed.message);
  return parsed.steps.map(({ takenMl, toMl }) => [takenMl, toMl]);
}

function sentence(text: string): string {
  const parsed = parseDilution(text);
  return parsed.ok ? parsed.sentence : parsed.message;
}

describe('what people write', () => {
  test.each([
    ['', []],
    [' 1 ', []],
    ['none', []],
    ['10 in 100', [[10, 100]]],
    ['10/100', [[10, 100]]],
    ['10 to 100', [[10, 100]]],
    ['10 made up to 100', [[10, 100]]],
    ['10 mL in 100 mL', [[10, 100]]],
    ['10ML->100ML', [[10, 100]]],
    ['2,5 in 50', [[2.5, 50]]],
    ['2.5 in 50', [[2.5, 50]]],
    ['10 in 100,5', [[10, 100.5]]],
    ['1+9', [[1, 10]]],
    ['0.1 + 0.2', [[0.1, 0.3]]],
    ['×10', [[1, 10]]],
    ['x 2,5', [[1, 2.5]]],
    ['10-fold', [[1, 10]]],
    ['100 µL in 10 mL', [[0.1, 10]]],
    ['100 μL in 10 mL', [[0.1, 10]]],
    ['3 ul in 1 ml', [[0.003, 1]]],
    ['100 in 1000 µL', [[0.1, 1]]],
    ['10 mL in 1 L', [[10, 1000]]],
    ['10 in 10', [[10, 10]]],
  ])('%j', (text, expected) => {
    expect(steps(text)).toEqual(expected);
  });

  test.each([
    '25→50, 10→100',
    '25→50,10→100',
    '25/50; 10/100',
    '25 in 50 then 10 in 100',
    '25 in 50\n10 in 100',
  ])('two steps: %j', (text) => {
    expect(steps(text)).toEqual([
      [25, 50],
      [10, 100],
    ]);
  });
});

describe('what was understood is said', () => {
  test.each([
    ['', 'Not diluted'],
    ['10 in 100', '10 mL made up to 100 mL: diluted 10 times'],
    ['25→50, 10→100', '25 mL made up to 50 mL, then 10 mL made up to 100 mL: diluted 20 times'],
    ['1+9', '1 part plus 9 parts, 10 parts in all: diluted 10 times'],
    ['1 mL + 9 mL', '1 mL plus 9 mL, 10 mL in all: diluted 10 times'],
    ['×5', '1 part made up to 5 parts: diluted 5 times'],
  ])('%j', (text, expected) => {
    expect(sentence(text)).toBe(expected);
  });
});

describe('what is refused, and how', () => {
  test.each([
    ['100 in 10', 'the end volume is smaller than what was taken'],
    ['10 mL in 100 µL', 'the end volume is smaller than what was taken'],
    ['0 in 10', 'must be above zero'],
    ['-1 in 10', 'must be above zero'],
    ['1:10', 'is read in two ways'],
    ['10', 'Is 10 a factor?'],
    ['1,234 in 5000', 'Is this 1.234 or 1234?'],
    ['a lot', 'is not understood'],
    ['10 in', 'is not understood'],
    ['1/2/3', 'is not understood'],
    ['NaN in 10', 'is not understood'],
    [Array(9).fill('1 in 2').join('; '), '8 are the most'],
  ])('%j', (text, expected) => {
    const parsed = parseDilution(text);
    expect(parsed.ok).toBe(false);
    expect(sentence(text)).toContain(expected);
  });
});

test('the written form is read back as the same steps', () => {
  const written = dilutionText([
    { takenMl: 0.1, toMl: 2.5 },
    { takenMl: 10, toMl: 100 },
  ]);
  expect(steps(written)).toEqual([
    [0.1, 2.5],
    [10, 100],
  ]);
  expect(
    dilutionFactor([
      { takenMl: 25, toMl: 50 },
      { takenMl: 10, toMl: 100 },
    ]),
  ).toBe(20);
});

describe('what is known of the vessels', () => {
  const wareOf = (text: string) => {
    const parsed = parseDilution(text);
    if (!parsed.ok) throw new Error(parsed.message);
    return parsed.steps.map(({ takenWare, toWare }) => [takenWare ?? null, toWare ?? null]);
  };

  test('tolerances stand behind the volumes, in their unit', () => {
    expect(wareOf('10 ±0.02 in 100 ±0.1')).toEqual([[{ toleranceMl: 0.02 }, { toleranceMl: 0.1 }]]);
    expect(wareOf('100 µL ±0.8 r0.3 in 10 mL')).toEqual([
      [{ toleranceMl: 0.0008, repeatabilityMl: 0.0003 }, null],
    ]);
    expect(wareOf('10 +-0,02 in 100')).toEqual([[{ toleranceMl: 0.02 }, null]]);
  });

  // ISO 648 and ISO 1042 typed from memory but for the 100 mL flask; ASTM E969 and E288: Kealey and Haines, table 2.6.
  test('a class takes them from the library', () => {
    expect(wareOf('10 in 100 class A')).toEqual([[{ toleranceMl: 0.02 }, { toleranceMl: 0.1 }]]);
    expect(wareOf('10 in 100 B')).toEqual([[{ toleranceMl: 0.04 }, { toleranceMl: 0.2 }]]);
    expect(wareOf('25 in 50 ASTM class A')).toEqual([[{ toleranceMl: 0.03 }, { toleranceMl: 0.05 }]]);
    expect(wareOf('100 µL in 10 mL class A')).toEqual([
      [{ toleranceMl: 0.0008, repeatabilityMl: 0.0003 }, { toleranceMl: 0.025 }],
    ]);
  });

  test('a class behind the last step holds for all; what was written stays', () => {
    expect(wareOf('25 in 50, 10 ±0.03 in 100 class A')).toEqual([
      [{ toleranceMl: 0.03 }, { toleranceMl: 0.06 }],
      [{ toleranceMl: 0.03 }, { toleranceMl: 0.1 }],
    ]);
  });

  test('it is said back, and printed as it is read', () => {
    expect(sentence('10 in 100 class A')).toBe(
      '10 mL (±0.02 mL) made up to 100 mL (±0.1 mL): diluted 10 times',
    );
    for (const text of ['10 ±0.02 in 100 ±0.1', '0.1 ±0.0008 r0.0003 in 10 ±0.025', '25 in 50 ±0.06']) {
      const parsed = parseDilution(text);
      expect(parsed.ok && dilutionText(parsed.steps)).toBe(text);
    }
  });

  test('what the library does not hold is asked for', () => {
    expect(sentence('10 in 30 class A')).toMatch(/no flask of 30 mL here\. Write its tolerance instead/);
    expect(sentence('30 in 100 class A')).toMatch(/no pipette of 30 mL/);
    expect(sentence('10 ±0 in 100')).toMatch(/above zero/);
  });
});
