import { expect, test } from 'vitest';
import { absorptivityRequest } from '@/lib/absorptivity/stored-absorptivity';
import { liveResults } from '@/lib/batch/live-results';
import { meaningOf } from '@/lib/batch/meaning';
import { readOn, readOnHref, readOnText } from '@/lib/batch/read-on';
import { calculateSamples, type Yardstick } from '@/lib/batch/yardstick';
import { EXAMPLE_CURVE, typedSample } from '../../../support/example-batch';

const KNOWN: Yardstick = {
  kind: 'absorptivity',
  request: absorptivityRequest({
    kind: 'molar',
    value: 11100,
    u: 100,
    source: 'analytical textbooks',
    conditions: '',
    unit: 'mg/L',
    formulaMass: 55.845,
    signal: 'absorbance',
    pathLengthMm: 10,
    pathLengthUMm: null,
    readingSd: null,
    confidence: 0.95,
    absorbanceLimit: 2,
  }),
};
const CURVE: Yardstick = { kind: 'curve', request: EXAMPLE_CURVE };

test('the same sample on either: Beer and Lambert agree with a curve of that slope', () => {
  const [onCurve, known] = [CURVE, KNOWN].map(
    (yardstick) => calculateSamples(yardstick, [typedSample('Weir 3', [0.4021, 0.4013])]).unknowns[0],
  );
  // 0.4017 / 0.198764 by ε 11 100 and M 55.845
  expect(known?.concentration?.value).toBeCloseTo(0.4017 / 0.198764, 4);
  expect(onCurve?.concentration?.value).toBeCloseTo(2.006, 2);
  expect(known).toMatchObject({ fieller: null, criticalValue: null, reportCase: 'value' });
  expect(onCurve?.criticalValue).toBeGreaterThan(0);
});

test('what a result means says what it rests on, and names no standards', () => {
  const meant = (readings: readonly (number | string)[]) => {
    const [live] = liveResults(KNOWN, [typedSample('sample', readings)]);
    if (!live?.ok) throw new Error('the sample is calculated');
    return meaningOf(live.result, null, 'mg/L');
  };
  expect(meant([0.4, 0.401])).toMatchObject({ tone: 'order', sentence: 'By the known absorptivity' });
  expect(meant([2.4])).toMatchObject({ tone: 'stop', code: 'READING_OVER_LIMIT' });
  expect(meant([-0.01, -0.012])).toMatchObject({ tone: 'decide', sentence: 'Not told from a blank' });
});

test('with the scatter of a reading there is a critical value', () => {
  const request = { ...KNOWN.request, readingSd: 0.001 };
  const [result] = calculateSamples({ kind: 'absorptivity', request } as Yardstick, [
    typedSample('blank', [0.001]),
  ]).unknowns;
  // 1.644854 is the one-sided normal quantile of 95 %
  expect(result?.criticalValue).toBeCloseTo((1.644854 * 0.001) / 0.198764, 7);
  expect(result?.report).toBe('< 0.008275 mg/L');
});

test('a batch is on one of the two, and its page leads there', () => {
  const view = {
    id: 'x',
    title: 'Iron',
    version: 2,
    status: 'saved',
    voidReason: null,
    newer: null,
  } as const;
  const known = readOn({ curve: null, absorptivity: view });
  expect(known.kind).toBe('absorptivity');
  expect(readOnHref(known, '/notebooks/n')).toBe('/notebooks/n/absorptivities/x');
  expect(readOnHref(readOn({ curve: view, absorptivity: null }), '/notebooks/n')).toBe(
    '/notebooks/n/curves/x',
  );
  expect(readOnText(known)).toBe('“Iron” version 2');
  expect(() => readOn({ curve: null, absorptivity: null })).toThrow();
});
