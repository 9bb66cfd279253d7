import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type UnknownResult } from '@/lib/engine';
import { expectDigits } from '../../../support/digits';
import { sharedFile } from '../../../support/shared';
import { request } from './requests';

interface GoldenUnknown {
  readonly measured: number;
  readonly uMeasured: number;
  readonly dilutionFactor: number;
  readonly computed: number;
  readonly u: number;
  readonly U: number;
  readonly case: string;
}
interface GoldenCurve {
  readonly intercept: { value: number; u: number };
  readonly slope: { value: number; u: number };
  readonly cov: number;
  readonly residualSd: number;
  readonly degreesOfFreedom: number;
  readonly criticalValueK2: number;
  readonly k: number;
  readonly unknowns: Readonly<Record<string, GoldenUnknown>>;
}

const CASES: Readonly<Record<string, UnknownResult['reportCase']>> = {
  'above the absorbance limit': 'notQuantified',
  'above the top standard': 'aboveTopStandard',
  value: 'value',
  'detected, below the lowest standard': 'belowLowestStandard',
  'below the critical value': 'belowCriticalValue',
};

function rows(file: string): Record<string, string>[] {
  const [header = [], ...lines] = readFileSync(file, 'utf8')
    .trim()
    .replace(/"[^"]*"/g, 'quoted')
    .split(/\r?\n/)
    .map((line) => line.split(','));
  return lines.map((cells) => Object.fromEntries(header.map((name, i) => [name, cells[i] ?? ''])));
}

// Reference: the demo batch computed with numpy and scipy from the measurement model, apart from this code.
const files = ['demo/golden.json', 'demo/calibration.csv', 'demo/run.csv'].map(sharedFile);
const [goldenFile, calibrationFile, runFile] = files;

function demoRequest(weighting: CurveRequest['weighting']): CurveRequest {
  const calibration = rows(calibrationFile ?? '');
  const levels = [...new Set(calibration.map((row) => Number(row.conc_mg_L_final)))];
  return request({
    weighting,
    varianceFunction: { s0: 0.0009, k: 0.0022 },
    standards: levels.map((concentration) => ({
      concentration,
      readings: calibration
        .filter((row) => Number(row.conc_mg_L_final) === concentration)
        .map((row) => Number(row.A510)),
    })),
    unknowns: rows(runFile ?? '').map((row) => ({
      name: row.id ?? '',
      readings: [Number(row.A1), Number(row.A2)],
      dilution: [
        { takenMl: 10, toMl: 10 * Number(row.prep) },
        { takenMl: 10, toMl: 10 * Number(row.dil) },
      ],
    })),
  });
}

describe.runIf(files.every((file) => file !== null))('the demo batch', () => {
  const golden = JSON.parse(readFileSync(goldenFile ?? '', 'utf8')) as {
    curves: Record<string, GoldenCurve>;
  };
  describe.each(['none', '1/x', '1/x2', 'varianceFunction'] as const)('weighting %s', (weighting) => {
    const expected = golden.curves[weighting] as GoldenCurve;
    const { curve, unknowns } = calculateStandardCurve(demoRequest(weighting));

    test('the curve', () => {
      expectDigits(curve.intercept.value, expected.intercept.value, 11);
      expectDigits(curve.intercept.u, expected.intercept.u, 11);
      expectDigits(curve.slope.value, expected.slope.value, 12);
      expectDigits(curve.slope.u, expected.slope.u, 11);
      expectDigits(curve.covariance[0]?.[1] ?? NaN, expected.cov, 11);
      expectDigits(curve.residualSd, expected.residualSd, 11);
      expectDigits(curve.criticalValue, expected.criticalValueK2, 11);
      expect(curve.criticalValueReadings).toBe(2);
    });

    test.each(unknowns.map((result) => [result.name, result] as const))('%s', (name, result) => {
      const row = expected.unknowns[name] as GoldenUnknown;
      const line = (id: string) => Number(result.working.find((step) => step.id === id)?.value);
      expectDigits(result.measured?.value ?? NaN, row.measured, 10);
      expectDigits(result.computed ?? NaN, row.computed, 10);
      expect(result.dilutionFactor.value).toBe(row.dilutionFactor);
      expect(result.reportCase).toBe(CASES[row.case]);
      if (result.flags.some((flag) => flag.code === 'REPLICATES_APART')) {
        // The golden numbers keep the curve's s; replicates that disagree more have their own, larger one.
        expect(result.measured?.u ?? NaN).toBeGreaterThanOrEqual(row.uMeasured * (1 - 1e-10));
        return;
      }
      expectDigits(result.measured?.u ?? NaN, row.uMeasured, 10);
      expectDigits(line('unknown.u'), row.u, 10);
      expectDigits(line('unknown.U'), row.U, 9);
      expectDigits(line('unknown.k'), expected.k, 10);
      if (result.concentration) expectDigits(result.concentration.U, row.U, 9);
    });

    test('few of them have replicates that disagree', () => {
      const apart = unknowns.filter((result) =>
        result.flags.some((flag) => flag.code === 'REPLICATES_APART'),
      );
      expect(apart.length).toBeLessThan(4);
    });
  });
});
