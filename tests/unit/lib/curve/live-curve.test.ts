import { describe, expect, test } from 'vitest';
import { drawnLine } from '@/lib/curve/curve-line';
import { liveCurve } from '@/lib/curve/live-curve';
import { standardRows } from '@/lib/curve/standard-rows';
import type { CurveDraftInput } from '@/lib/schemas/curve';
import type { RuleTexts } from '@/lib/schemas/spectrum-rule';
import { curveDraftInput } from '../../../support/curve-draft';

const RULE: RuleTexts = { rule: 'point', at: '510', half: '', from: '', to: '', minus: '' };
const live = (draft: CurveDraftInput, calculation: object = {}) =>
  liveCurve({
    calculation: { ...draft.calculation, ...calculation },
    rule: RULE,
    standards: draft.standards,
    spectra: new Map(),
  });

describe('liveCurve', () => {
  test('follows what is typed, and leaves rows out that are not complete yet', () => {
    const draft = curveDraftInput();
    draft.standards.splice(1, 0, {
      role: 'standard',
      name: 'S9',
      concentration: '',
      leftOut: null,
      readings: [],
    });
    const answer = live(draft);
    expect(answer.places).toEqual([0, 2, 3, 4, 5]);
    expect(answer.answer?.curve.n).toBe(15);
  });

  test.each([
    [curveDraftInput([]), {}, /Enter standards/],
    [
      curveDraftInput([
        ['S1', '1', '0.2'],
        ['S2', '1', '0.3'],
        ['S3', '1', '0.4'],
      ]),
      {},
      /same concentration|different concentrations/,
    ],
    [
      curveDraftInput([
        ['S1', '1', '0.2'],
        ['S2', '2', '0.4'],
      ]),
      {},
      /three different concentrations/,
    ],
    [curveDraftInput(), { pathLengthMm: '0' }, /above zero/],
    [curveDraftInput(), { unit: 'mmol/L', formulaMass: '' }, /formula mass/],
    [curveDraftInput(), { blankRule: 'subtract' }, /write "blank"/],
    [curveDraftInput(), { blankRule: 'level', model: 'proportional' }, /through zero/],
    [curveDraftInput([['S1', '1', '1,234']]), {}, /1\.234 or 1234/],
    [
      curveDraftInput([
        ['B', 'blank', 'OVER'],
        ['S1', '1', '0.1'],
        ['S2', '2', '0.2'],
        ['S3', '3', '0.3'],
      ]),
      { blankRule: 'subtract' },
      /blank reading has no number/,
    ],
  ])('says what is missing instead of a line: %#', (draft, change, sentence) => {
    const answer = live(draft, change);
    expect(answer.answer).toBeNull();
    expect(answer.sentence).toMatch(sentence);
  });

  test('a zero standard beside a subtracted blank is noted, and one under 1/x is left out', () => {
    const rows = [
      ['B', 'blank', '0.01'],
      ['S0', '0', '0.01'],
      ['S1', '1', '0.21'],
      ['S2', '2', '0.4'],
      ['S3', '3', '0.62'],
    ] as const;
    const subtracted = live(curveDraftInput(rows), { blankRule: 'subtract' });
    expect(subtracted.answer?.curve.flags.map(({ code }) => code)).toContain('ZERO_STANDARD_WITH_SUBTRACT');
    const weighted = live(curveDraftInput(rows), { weighting: '1/x' });
    expect(weighted.answer?.curve.flags.map(({ code }) => code)).toContain('ZERO_STANDARD_LEFT_OUT');
    const row = standardRows(weighted.standards, weighted.answer?.curve ?? null)[1];
    expect(row?.readings[0]?.leftOutBecause).toMatch(/zero has no weight/);
  });
});

describe('standardRows', () => {
  test('reads each standard back and keeps blanks that are left out in the table', () => {
    const draft = curveDraftInput([
      ['B', 'blank', '0.01', '0.02'],
      ['S1', '1', '0.21'],
      ['S2', '2', '0.4'],
      ['S3', '3', '0.62'],
    ]);
    Object.assign(draft.standards[0]?.readings[0] ?? {}, { leftOut: 'bubble' });
    const { standards, answer } = live(draft, { blankRule: 'level' });
    const [blank, s1] = standardRows(standards, answer?.curve ?? null);
    expect(blank?.readings.map(({ leftOutBecause }) => leftOutBecause)).toEqual(['bubble', null]);
    const line = answer?.curve;
    if (!line || !s1) throw new Error('these standards make a curve');
    expect(s1.backCalculated).toBeCloseTo((0.21 - line.intercept.value) / line.slope.value, 12);
    expect(blank?.backCalculated).toBeCloseTo((0.02 - line.intercept.value) / line.slope.value, 12);
    expect(blank?.errorPercent).toBeNull();
  });
});

describe('drawnLine', () => {
  const curve = live(curveDraftInput()).answer?.curve;
  if (!curve) throw new Error('the example makes a curve');

  test('has the textbook bands of an unweighted line at both ends', () => {
    // t(0.975; 13) = 2.160369 (NIST/SEMATECH e-Handbook, table of Student's t: 2.160);
    // band of the line t·s·√(1/n + (x − x̄)²/Sxx), of one reading t·s·√(1 + 1/n + (x − x̄)²/Sxx)
    const line = drawnLine(curve);
    for (const at of [0, line.concentration.length - 1]) {
      const x = line.concentration[at] ?? NaN;
      const inside = 1 / 15 + (x - curve.meanConcentration) ** 2 / curve.sxx;
      const half = (band?: { high: number[] }) => (band?.high[at] ?? NaN) - (line.fitted[at] ?? NaN);
      expect(half(line.confidence)).toBeCloseTo(2.160369 * curve.residualSd * Math.sqrt(inside), 8);
      expect(half(line.prediction)).toBeCloseTo(2.160369 * curve.residualSd * Math.sqrt(1 + inside), 8);
    }
  });

  test('widens with the concentration under 1/x², and not below the lowest standard', () => {
    const weighted = live(curveDraftInput(), { weighting: '1/x2' }).answer?.curve;
    if (!weighted) throw new Error('the example makes a curve');
    const { concentration, fitted, prediction } = drawnLine(weighted);
    const at = (x: number) => concentration.findIndex((value) => value >= x);
    const half = (x: number) => (prediction?.high[at(x)] ?? NaN) - (fitted[at(x)] ?? NaN);
    expect(half(4)).toBeGreaterThan(2 * half(1));
    expect(half(0)).toBeGreaterThan(0);
  });
});
