import { describe, expect, test } from 'vitest';
import { allLimits, type LimitsRequest } from '@/lib/engine';
import { below } from '@/lib/engine/errors';
import { currieLevels } from '@/lib/engine/limits/currie';
import { methodDetectionLimit, type MdlStudy } from '@/lib/engine/limits/mdl';
import { expectDigits } from '../../../../support/digits';
import { request, standardsOf } from '../requests';

// Calibration, ten blank readings and study of an invented iron method; figures by an independent numpy/scipy script.
const curve = request({
  standards: standardsOf(
    [0, 0, 0.1, 0.1, 0.25, 0.25, 0.5, 0.5, 1, 1, 2, 2, 4, 4],
    [
      0.0034, 0.0041, 0.0249, 0.0255, 0.0544, 0.0511, 0.1031, 0.1036, 0.2015, 0.2031, 0.4022, 0.4019, 0.7957,
      0.7962,
    ],
  ),
});
const blankReadings = [0.0042, 0.0053, 0.0065, 0.0045, 0.0031, 0.0041, 0.0051, 0.0064, 0.0041, 0.005];
const spread = (values: readonly (number | null)[]) =>
  values.map((value, i) => ({ value, batch: `B${i % 3}`, date: `2026-11-0${1 + (i % 3)}` }));
const study: MdlStudy = {
  spikeLevel: 0.1,
  spikes: spread([0.0746, 0.1019, 0.1069, 0.0968, 0.116, 0.0988, 0.0908, 0.0958]),
  blanks: spread([0.0081, -0.0071, -0.0061, -0.0202, 0.001, 0.0181, 0.004, 0.0081]),
};
const asked: LimitsRequest = { unit: 'mg/L', curve, blankReadings, readings: 2, factor: 2, study };
const answer = allLimits(asked);
const find = (
  of: { limits: readonly { name: string; basis: string; value: number }[] },
  name: string,
  basis = '',
) => of.limits.find((limit) => limit.name === name && limit.basis.includes(basis))?.value ?? NaN;

describe('all limits on one scale, in the sample', () => {
  test.each([
    ['ICH Q2 detection limit', 'intercept', '0.0145'],
    ['ISO 11843-2 critical value', '', '0.0177'],
    ['Currie critical level', '', '0.0206'],
    ['DIN 32645 detection limit', '', '0.0266'],
    ['ISO 11843-2 minimum detectable value', '', '0.0347'],
    ['ICH Q2 detection limit', '10 blank readings', '0.0354'],
    ['40 CFR 136 method detection limit from spikes (MDL_S)', '', '0.0363'],
    ['40 CFR 136 method detection limit from blanks (MDL_b)', '', '0.0360'],
    ['40 CFR 136 method detection limit', '', '0.0363'],
    ['Currie detection limit', '', '0.0412'],
    ['ICH Q2 detection limit', 'residual', '0.0416'],
  ])('%s (%s) is %s', (name, basis, value) => {
    expect(find(answer, name, basis).toFixed(4)).toBe(value);
  });

  test('each says its formula, source and risks', () => {
    for (const limit of answer.limits) {
      expect(limit.formula).toBeTruthy();
      expect(limit.source).toBeTruthy();
      expect(limit.alpha).not.toBeUndefined();
      expect(limit.beta).not.toBeUndefined();
    }
    expect(answer.notMade).toEqual([]);
    expect(answer.flags).toEqual([]);
    expect(answer.unit).toBe('mg/L');
  });

  test('other risks move ISO 11843-2 alone', () => {
    const strict = allLimits({ ...asked, alpha: 0.01, beta: 0.05 });
    expect(find(strict, 'ISO 11843-2 critical value', 'risks 1 % and 5 %')).toBeGreaterThan(
      find(answer, 'ISO 11843-2 critical value'),
    );
    expect(find(strict, 'Currie critical level')).toBe(find(answer, 'Currie critical level'));
    // t(0.99; 12) = 2.680998, t(0.95; 12) = 1.782288 (tables).
    expectDigits(
      find(strict, 'ISO 11843-2 critical value') / find(answer, 'ISO 11843-2 critical value'),
      2.680998 / 1.782288,
      6,
    );
  });
});

describe('what the data do not allow has its reason', () => {
  test('no data at all', () => {
    const { limits, notMade } = allLimits({ unit: 'mg/L' });
    expect(limits).toEqual([]);
    expect(notMade.map((item) => item.name)).toEqual([
      'ICH Q2, residual standard deviation',
      'ICH Q2, intercept',
      'ISO 11843-2',
      'DIN 32645',
      'ICH Q2, blank',
      'Currie',
      '40 CFR 136 method detection limit',
    ]);
  });

  test('a line through zero, a loose slope, a curve without blanks', () => {
    const zero = allLimits({ unit: 'mg/L', curve: request({ model: 'proportional' }) });
    expect(zero.notMade.map((item) => item.name)).toEqual([
      'ICH Q2, intercept',
      'ICH Q2, blank',
      'Currie',
      '40 CFR 136 method detection limit',
    ]);
    const loose = allLimits({
      unit: 'mg/L',
      curve: request({ standards: standardsOf([1, 2, 3, 4], [0.1, 0.3, 0.15, 0.35]) }),
    });
    expect(loose.notMade[0]?.name).toBe('DIN 32645 quantification limit');
  });

  test('blanks of the curve serve where none are given, method blanks where there is no curve', () => {
    const own = allLimits({ unit: 'mg/L', curve });
    expect(find(own, 'Currie critical level', '2 blank readings')).toBeGreaterThan(0);
    const alone = allLimits({ unit: 'mg/L', study, factor: 5 });
    // Results already are concentrations in the sample: no slope, no factor.
    const sd = 0.0119;
    expect(
      Math.abs(find(alone, 'Currie critical level, well-known blank', '8 method blanks') / (1.8946 * sd) - 1),
    ).toBeLessThan(0.02);
  });
});

test('blanks of a study without a number say nothing of their scatter', () => {
  const blanks = [{ value: null }, { value: 0.01 }, { value: null }];
  const { notMade } = allLimits({ unit: 'mg/L', study: { spikes: [], blanks } });
  expect(notMade.map((item) => item.name)).toContain('Currie');
});

describe('Currie', () => {
  // Currie 1995 (typed from memory): 1.645, 3.29 for a well-known blank, 2.33, 4.65 for a paired one.
  test('has its factors for a known standard deviation', () => {
    const known = currieLevels({ sd: 1, slope: 1 }, Infinity, Infinity);
    const paired = currieLevels({ sd: 1, slope: 1 }, Infinity, 1);
    expect(known.critical.toFixed(3)).toBe('1.645');
    expect(known.detection.toFixed(2)).toBe('3.29');
    expect(paired.critical.toFixed(2)).toBe('2.33');
    expect(paired.detection.toFixed(2)).toBe('4.65');
  });
});

describe('40 CFR 136', () => {
  // t(0.99; 6) = 3.143 is the factor that the rule itself prints for seven replicates.
  test('multiplies the standard deviation of seven spikes by 3.143', () => {
    const seven = spread([1, 2, 3, 4, 5, 6, 7]);
    const { limits } = methodDetectionLimit({ spikes: seven, blanks: seven }, 'mg/L');
    expect(
      (find({ limits }, '40 CFR 136 method detection limit from spikes (MDL_S)') / Math.sqrt(28 / 6)).toFixed(
        3,
      ),
    ).toBe('3.143');
    expectDigits(
      find({ limits }, '40 CFR 136 method detection limit from blanks (MDL_b)') -
        find({ limits }, '40 CFR 136 method detection limit from spikes (MDL_S)'),
      4,
      12,
    );
  });

  test('takes the highest blank where some gave no number, and none where none did', () => {
    const some = methodDetectionLimit(
      { ...study, blanks: spread([0.01, null, 0.05, null, 0.02, null, null]) },
      'mg/L',
    );
    expect(find(some, '40 CFR 136 method detection limit')).toBe(0.05);
    const none = methodDetectionLimit({ ...study, blanks: spread(Array<null>(7).fill(null)) }, 'mg/L');
    expect(none.notMade[0]?.reason).toMatch(/does not apply/);
    expect(find(none, '40 CFR 136 method detection limit').toFixed(4)).toBe('0.0363');
  });

  test('a mean blank below zero counts as zero', () => {
    const shifted = { ...study, blanks: spread([-0.01, -0.02, -0.03, -0.01, -0.02, -0.03, -0.02]) };
    const plain = { ...study, blanks: spread([0.01, 0, -0.01, 0.01, 0, -0.01, 0]) };
    const name = '40 CFR 136 method detection limit from blanks (MDL_b)';
    expectDigits(
      find(methodDetectionLimit(shifted, ''), name),
      find(methodDetectionLimit(plain, ''), name),
      12,
    );
  });

  test('is not made of too few spikes or of spikes without numbers', () => {
    const few = methodDetectionLimit({ spikes: study.spikes.slice(0, 6), blanks: study.blanks }, 'mg/L');
    expect(few.limits).toEqual([]);
    expect(few.notMade[0]?.reason).toMatch(/at least 7 spiked samples, got 6/);
    for (const value of [null, 0])
      expect(
        methodDetectionLimit({ spikes: [...study.spikes, { value }], blanks: [] }, '').notMade[0]?.reason,
      ).toMatch(/higher spike/);
  });

  test('flags a study of one batch or day, or of too few blanks', () => {
    const oneDay = study.spikes.map(({ value }) => ({ value, batch: 'B1', date: 'today' }));
    const { flags } = methodDetectionLimit({ spikes: oneDay, blanks: study.blanks.slice(0, 6) }, 'mg/L');
    expect(flags.map((flag) => flag.code)).toEqual(['MDL_DESIGN']);
    const unsaid = study.spikes.map(({ value }) => ({ value }));
    expect(methodDetectionLimit({ spikes: unsaid, blanks: study.blanks }, '').flags[0]?.message).toMatch(
      /spikes of 0 of 3 batches/,
    );
    expect(flags[0]?.message).toMatch(/6 of 7 blanks, spikes of 1 of 3 batches, spikes of 1 of 3 dates/);
    expect(methodDetectionLimit({ spikes: study.spikes, blanks: [] }, '').flags[0]?.message).toMatch(
      /0 of 7 blanks\./,
    );
  });

  // 0.0363 found: spikes of 0.0726 to 0.363 are in order.
  test.each([
    [0.0725, ['MDL_SPIKE_LEVEL']],
    [0.073, []],
    [0.362, []],
    [0.364, ['MDL_SPIKE_LEVEL']],
    [undefined, []],
  ])('spikes of %s raise %j', (spikeLevel, codes) => {
    const { flags } = methodDetectionLimit(
      { ...study, ...(spikeLevel ? { spikeLevel } : { spikeLevel: undefined }) } as MdlStudy,
      'mg/L',
    );
    expect(flags.map((flag) => flag.code)).toEqual(codes);
    if (codes.length > 0) expect(flags[0]?.message).not.toMatch(/undefined|NaN/);
  });
});

test('a bug below a part of the request passes as it is', () => {
  const bug = new TypeError('a bug');
  expect(() =>
    below('/curve', () => {
      throw bug;
    }),
  ).toThrow(bug);
});

test.each<[string, string, Partial<LimitsRequest>]>([
  ['UNKNOWN_CHOICE', '/unit', { unit: 'ppm' as 'mg/L' }],
  ['UNKNOWN_CHOICE', '/curve/unit', { unit: 'g/L' }],
  ['NO_STANDARDS', '/curve/standards', { curve: request({ standards: [] }) }],
  ['BLANK_CENSORED', '/blankReadings/1', { blankReadings: [0.1, 'OVER'] }],
  ['NO_READINGS', '/readings', { readings: 0 }],
  ['CONFIDENCE_OUT_OF_RANGE', '/alpha', { alpha: 0.5 }],
  ['CONFIDENCE_OUT_OF_RANGE', '/beta', { beta: 0 }],
  ['VOLUME_NOT_POSITIVE', '/factor', { factor: 0 }],
  ['NOT_FINITE', '/study/spikes/0/value', { study: { spikes: [{ value: NaN }], blanks: [] } }],
  ['CONCENTRATION_NEGATIVE', '/study/spikeLevel', { study: { ...study, spikeLevel: 0 } }],
])('refuses %s at %s', (code, pointer, changes) => {
  expect(() => allLimits({ ...asked, ...changes })).toThrow(expect.objectContaining({ code, pointer }));
});
