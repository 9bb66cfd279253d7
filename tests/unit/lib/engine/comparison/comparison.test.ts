import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, compareModels, effectOfLeavingOut } from '@/lib/engine';
import { orRefusal } from '@/lib/engine/comparison/answer-under';
import { expectDigits } from '../../../../support/digits';
import { request, unknown } from '../requests';

const asked = request({
  unknowns: [unknown([0.35, 0.352], { name: 'A' }), unknown(['OVER'], { name: 'B' })],
});

describe('compareModels', () => {
  const rows = compareModels(asked);
  const row = (model: string, weighting: string) =>
    rows.find((item) => item.model === model && item.weighting === weighting);

  // Identity: a row is what the whole calculation answers for that model and weighting.
  test.each([
    ['linear', 'none'],
    ['proportional', '1/x'],
    ['linear', '1/y2'],
  ] as const)('%s under %s is the answer of that curve', (model, weighting) => {
    const whole = calculateStandardCurve({ ...asked, model, weighting });
    const found = row(model, weighting);
    if (found === undefined || found.reason !== undefined) throw new Error('no such row');
    expect(found.residualSd).toBe(whole.curve.residualSd);
    expect(found.relativeStandardErrorPercent).toBe(whole.curve.relativeStandardErrorPercent);
    expect(found.unknowns[0]?.measured).toEqual(whole.unknowns[0]?.measured);
    expect(found.unknowns[0]?.concentration?.u).toBe(whole.unknowns[0]?.concentration?.u);
  });

  test('the one in use moves nothing; the others say how far, in per cent and in u', () => {
    const used = row('linear', 'none');
    const other = row('proportional', 'none');
    if (used?.reason !== undefined || other?.reason !== undefined) throw new Error('refused');
    expect(used?.inUse).toBe(true);
    expect(rows.filter((item) => item.inUse)).toHaveLength(1);
    expect(used?.unknowns[0]).toMatchObject({ changePercent: 0, changeInU: 0 });
    const [before, after] = [used?.unknowns[0]?.measured, other?.unknowns[0]?.measured];
    const shift = (after?.value ?? NaN) - (before?.value ?? NaN);
    expectDigits(other?.unknowns[0]?.changePercent ?? NaN, (100 * shift) / (before?.value ?? NaN), 12);
    expectDigits(other?.unknowns[0]?.changeInU ?? NaN, shift / (before?.u ?? NaN), 12);
    expect(other?.unknowns[1]).toMatchObject({
      name: 'B',
      measured: null,
      concentration: null,
      changePercent: null,
    });
  });

  test('what cannot be had says why', () => {
    expect(row('quadratic', 'none')).toMatchObject({ code: 'QUADRATIC_LEVELS' });
    expect(row('linear', 'replicates')).toMatchObject({ code: 'REPLICATES_TOO_FEW' });
    expect(row('linear', 'varianceFunction')).toMatchObject({ code: 'VARIANCE_FUNCTION_MISSING' });
    expect(row('linear', 'given')).toBeUndefined();
  });

  test('given weights, a given variance function and a learned one take part', () => {
    const weighted = asked.standards.map((standard) => ({ ...standard, weight: 1 / standard.concentration }));
    const given = compareModels({ ...asked, standards: weighted, varianceFunction: { s0: 0.001, k: 0.01 } });
    expect(given.filter((item) => item.weighting === 'given' && item.reason === undefined)).toHaveLength(2);
    expect(
      given.filter((item) => item.weighting === 'varianceFunction' && item.reason === undefined),
    ).toHaveLength(2);
    // 15 degrees of freedom; scatter that grows from a floor.
    const shape = [-1, -0.3, 0.2, 1.1];
    const taught = [1, 2, 4, 8, 16].map((concentration) => ({
      concentration,
      readings: shape.map((z) => 0.05 * concentration + Math.hypot(0.002, 0.001 * concentration) * z),
    }));
    const learned = compareModels({ ...asked, standards: taught });
    expect(
      learned.filter((item) => item.weighting === 'varianceFunction' && item.reason === undefined),
    ).toHaveLength(2);
  });

  test('a curve in use that is refused leaves the others without a comparison', () => {
    const found = compareModels({ ...asked, model: 'quadratic' });
    const plain = found.find((item) => item.model === 'linear' && item.weighting === 'none');
    expect(plain).toMatchObject({ inUse: false, unknowns: [{ changePercent: null, changeInU: null }, {}] });
  });

  test('standards that fit nothing are refused in every row', () => {
    const one = { ...asked, standards: asked.standards.slice(0, 1) };
    expect(compareModels(one).every((item) => item.reason !== undefined)).toBe(true);
  });

  test('a request that is wrong under every model is refused as a whole', () => {
    expect(() => compareModels({ ...asked, confidence: 2 })).toThrow(
      expect.objectContaining({ code: 'CONFIDENCE_OUT_OF_RANGE' }),
    );
    expect(() => compareModels({ ...asked, unit: 'lb/gal' as 'mg/L' })).toThrow(
      expect.objectContaining({ code: 'UNKNOWN_CHOICE' }),
    );
  });

  test('an exact curve and a result of zero have no per cent and no u to divide by', () => {
    const exact = request({
      standards: [1, 2, 4, 8].map((concentration) => ({ concentration, readings: [concentration / 8] })),
      unknowns: [unknown([0])],
    });
    const [used] = compareModels(exact);
    expect(used).toMatchObject({ inUse: true, unknowns: [{ changePercent: null, changeInU: null }] });
  });
});

test('an error that is no refusal goes on its way', () => {
  expect(() =>
    orRefusal(() => {
      throw new TypeError('not the engine');
    }),
  ).toThrow(TypeError);
});

describe('effectOfLeavingOut', () => {
  const effects = effectOfLeavingOut(asked);

  test('goes through every standard and every reading of it', () => {
    expect(effects.map(({ standardIndex, replicate }) => [standardIndex, replicate])).toEqual(
      [0, 1, 2, 3, 4].flatMap((index) => [
        [index, null],
        [index, 1],
        [index, 2],
      ]),
    );
  });

  // Identity: it is the calculation of the request with the standard or reading excluded.
  test.each([
    ['the top standard', 4, null],
    ['one reading', 2, 2],
  ] as const)('%s: the answer of the curve without it', (_what, standardIndex, replicate) => {
    const before = calculateStandardCurve(asked);
    const standards = asked.standards.map((standard, i) => {
      if (i !== standardIndex) return standard;
      return replicate === null
        ? { ...standard, excluded: true }
        : { ...standard, excludedReadings: [replicate - 1] };
    });
    const after = calculateStandardCurve({ ...asked, standards });
    const effect = effects.find(
      (item) => item.standardIndex === standardIndex && item.replicate === replicate,
    );
    if (effect === undefined || effect.reason !== undefined) throw new Error('refused');
    expect(effect.slope).toBe(after.curve.slope.value);
    expectDigits(
      effect.slopeChangePercent,
      100 * (after.curve.slope.value / before.curve.slope.value - 1),
      9,
    );
    expect(effect.residualSd).toBe(after.curve.residualSd);
    expect(effect.range).toEqual(after.curve.range);
    expect(effect.unknowns[0]?.measured).toEqual(after.unknowns[0]?.measured);
    expect(effect.unknowns[0]?.report).toBe(after.unknowns[0]?.report);
  });

  test('passes over what is left out already, and names what cannot be left out', () => {
    const three = [
      { concentration: 1, readings: [0.1, 0.102], excludedReadings: [1] },
      { concentration: 2, readings: [0.2] },
      { concentration: 4, readings: [0.41, 0.4, 0.405], excludedReadings: [0] },
      { concentration: 8, readings: [0.9], excluded: true },
    ];
    const found = effectOfLeavingOut({ ...asked, standards: three });
    expect(found.map(({ standardIndex, replicate }) => [standardIndex, replicate])).toEqual([
      [0, null],
      [1, null],
      [2, null],
      [2, 2],
      [2, 3],
    ]);
    expect(found[0]).toMatchObject({ code: 'TOO_FEW_STANDARDS', name: 'standard 1', concentration: 1 });
    expect(found[0]?.reason).toMatch(/needs at least 3 distinct concentrations, got 2/);
  });

  test('leaves out whole standards only when there are very many readings', () => {
    const many = [1, 2, 4].map((concentration) => ({
      concentration,
      readings: Array.from({ length: 67 }, (_, i) => 0.1 * concentration + 1e-4 * (i % 5)),
    }));
    expect(effectOfLeavingOut({ ...asked, standards: many }).every((item) => item.replicate === null)).toBe(
      true,
    );
  });

  test('refuses a request that does not fit as it stands', () => {
    expect(() =>
      effectOfLeavingOut({ ...asked, standards: asked.standards.map((s) => ({ ...s, excluded: true })) }),
    ).toThrow(expect.objectContaining({ message: expect.stringMatching(/got none$/) as string }));
    expect(() => effectOfLeavingOut({ ...asked, standards: asked.standards.slice(0, 2) })).toThrow(
      expect.objectContaining({ code: 'TOO_FEW_STANDARDS' }),
    );
  });
});
