import { describe, expect, test } from 'vitest';
import { effectsOn, leftOutWords } from '@/lib/curve/left-out-words';
import { limitScale } from '@/lib/curve/limit-scale';
import { modelComparison } from '@/lib/curve/model-comparison';
import { calculateStandardCurve, compareModels } from '@/lib/engine';
import { request, unknown } from '../engine/requests';

const asked = request({ unknowns: [unknown([0.5021, 0.5034], { name: 'S1' })] });

describe('modelComparison', () => {
  test('the model in use leads and changes nothing; what cannot be had says why', () => {
    const { rows, refused, names } = modelComparison(compareModels(asked));
    expect(rows[0]).toMatchObject({
      words: 'line, unweighted',
      inUse: true,
      largestChangeInU: 0,
      largestOf: null,
    });
    expect(names).toEqual(['S1']);
    expect(
      rows.some(({ words, largestOf }) => words === 'line through zero, unweighted' && largestOf === 'S1'),
    ).toBe(true);
    // five levels are too few for a quadratic, two readings a level too few for weights from replicates
    expect(refused.map(({ words }) => words)).toEqual(
      expect.arrayContaining(['quadratic, unweighted', 'line, by its replicates']),
    );
  });

  test('without samples there is no change to speak of', () => {
    const { rows, names } = modelComparison(compareModels(request()));
    expect(names).toEqual([]);
    expect(rows[0]?.largestChangeInU).toBeNull();
  });
});

describe('leftOutWords', () => {
  const standards = [
    { role: 'blank', name: 'blank', concentration: 0, pathLengthMm: 10, excludedReason: null, readings: [] },
    ...asked.standards.map(({ concentration }) => ({
      ...{ role: 'standard', name: `S${concentration}`, concentration, pathLengthMm: 10 },
      ...{ excludedReason: null, readings: [] },
    })),
  ] as Parameters<typeof effectsOn>[1];
  const { curve } = calculateStandardCurve(asked);

  test('says what the slope, the scatter and the range become', () => {
    const whole = effectsOn(asked, standards, 5).find(({ replicate }) => replicate === null);
    if (!whole) throw new Error('the top standard has an effect');
    expect(leftOutWords(whole, curve)).toMatch(
      /^Without it the slope is 0\.\d+ \([+−][\d.]+ %\), the residual SD .* The curve would cover 1 to 6 mg\/L only\.$/,
    );
    const inner = effectsOn(asked, standards, 3).find(({ replicate }) => replicate === 2);
    if (!inner) throw new Error('the second reading of an inner standard has an effect');
    expect(leftOutWords(inner, curve)).toMatch(/The range stays\.$/);
  });

  test('a blank has none, and a curve that falls apart says so', () => {
    expect(effectsOn(asked, standards, 0)).toEqual([]);
    const three = { ...asked, standards: asked.standards.slice(0, 3) };
    const [whole] = effectsOn(three, standards, 1);
    if (!whole) throw new Error('leaving one of three out has an answer');
    expect(leftOutWords(whole, curve)).toMatch(/^Without it there is no curve: /);
  });
});

describe('limitScale', () => {
  // Identity: on a logarithmic ruler equal ratios are equal distances.
  test('equal ratios stand equally far apart', () => {
    const scale = limitScale([0.01, 10]);
    expect(scale.at(0.1) - scale.at(0.01)).toBeCloseTo(scale.at(10) - scale.at(1), 12);
    expect(scale.at(-0.2)).toBe(0);
    expect(scale.at(1000)).toBe(1);
  });

  test('its ticks are round and few', () => {
    expect(limitScale([0.02, 0.4]).ticks).toEqual([0.02, 0.05, 0.1, 0.2, 0.5]);
    expect(limitScale([1e-6, 1e3]).ticks.every((tick) => Number.isInteger(Math.log10(tick)))).toBe(true);
  });
});

test('a reading above the absorbance limit makes no number in the comparison', () => {
  const over = request({ unknowns: [unknown([0.5021]), unknown([2.6], { name: 'too strong' })] });
  const { rows, names } = modelComparison(compareModels(over));
  expect(names).toEqual(['unknown 1', 'too strong']);
  expect(rows.map(({ unknowns }) => unknowns[1])).toEqual(rows.map(() => null));
  expect(rows.some(({ largestOf }) => largestOf === 'too strong')).toBe(false);
});
