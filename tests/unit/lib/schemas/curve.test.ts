import { describe, expect, test } from 'vitest';
import { curveDraft, saveCurveForm } from '@/lib/schemas/curve';
import { curveDraftInput } from '../../../support/curve-draft';

const issues = (draft: unknown) => {
  const parsed = curveDraft.safeParse(draft);
  return parsed.success
    ? {}
    : Object.fromEntries(parsed.error.issues.map(({ path, message }) => [path.join('.'), message]));
};
const withCalculation = (change: object) => {
  const draft = curveDraftInput();
  return { ...draft, calculation: { ...draft.calculation, ...change } };
};

describe('curveDraft', () => {
  test('reads texts as numbers, decimal commas too', () => {
    const draft = curveDraft.parse(
      withCalculation({ pathLengthMm: '0,5', standardsRelativeUPercent: '0,4' }),
    );
    expect(draft.calculation).toMatchObject({
      pathLengthMm: 0.5,
      standardsRelativeU: 0.004,
      formulaMass: 55.845,
    });
    expect(draft.rule).toEqual({ kind: 'point', wavelengthNm: 510 });
  });

  test.each([
    [withCalculation({ pathLengthMm: '0' }), 'calculation.pathLengthMm', /above zero/],
    [withCalculation({ pathLengthMm: '1,234' }), 'calculation.pathLengthMm', /1\.234 or 1234/],
    [withCalculation({ unit: 'mmol/L', formulaMass: '' }), 'calculation.formulaMass', /formula mass/],
    [withCalculation({ formulaMass: '-1' }), 'calculation.formulaMass', /above zero/],
    [withCalculation({ weighting: 'varianceFunction' }), 'calculation.varianceS0', /Enter the constant part/],
    [withCalculation({ blankRule: 'level', model: 'proportional' }), 'calculation.blankRule', /through zero/],
    [{ ...curveDraftInput(), rule: { ...curveDraftInput().rule, at: '' } }, 'rule.at', /number/],
    [
      {
        ...curveDraftInput(),
        rule: { ...curveDraftInput().rule, rule: 'windowMaximum' as const, from: '550', to: '450' },
      },
      'rule.to',
      /above its beginning/,
    ],
    [curveDraftInput([['S1', '-1', '0.1']]), 'standards.0.concentration', /below zero/],
    [curveDraftInput([['S1', 'Infinity', '0.1']]), 'standards.0.concentration', /number/],
    [curveDraftInput([['S1', '1']]), 'standards.0.readings', /reading/],
    [curveDraftInput([]), 'standards', /standards/],
    [
      { ...curveDraftInput(), about: { ...curveDraftInput().about, analyte: ' ' } },
      'about.analyte',
      /what is measured/,
    ],
  ])('says at its place what is wrong: %#', (draft, path, message) => {
    expect(issues(draft)[path]).toMatch(message);
  });

  test('leaving out without a reason is refused', () => {
    const draft = curveDraftInput();
    Object.assign(draft.standards[0] ?? {}, { leftOut: ' ' });
    expect(issues(draft)['standards.0.leftOut']).toMatch(/why/);
  });
});

test('a form whose draft is not JSON gets a sentence', () => {
  const form = { notebookId: crypto.randomUUID(), saveKey: 'long enough', baseId: '', draft: '{' };
  expect(saveCurveForm.safeParse(form).error?.issues[0]?.message).toMatch(/Load the page again/);
});
