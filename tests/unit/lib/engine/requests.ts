import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { calculateStandardCurve, type CurveRequest, type UnknownRequest } from '@/lib/engine';

/** Data of a published reference, with its SOURCE.md beside it. */
export function reference<T>(name: string): T {
  const file = fileURLToPath(new URL(`../../../../fixtures/reference/${name}/data.json`, import.meta.url));
  return JSON.parse(readFileSync(file, 'utf8')) as T;
}

/** A plain five-level curve in duplicate with a little scatter; every member can be overridden. */
export function request(changes: Partial<CurveRequest> = {}): CurveRequest {
  return {
    signal: 'absorbance',
    pathLengthMm: 10,
    unit: 'mg/L',
    model: 'linear',
    weighting: 'none',
    confidence: 0.95,
    absorbanceLimit: 2,
    standards: [
      { concentration: 1, readings: [0.1042, 0.1036] },
      { concentration: 2, readings: [0.2031, 0.2046] },
      { concentration: 4, readings: [0.4049, 0.4028] },
      { concentration: 6, readings: [0.6033, 0.6051] },
      { concentration: 8, readings: [0.8027, 0.8052] },
    ],
    unknowns: [],
    ...changes,
  };
}

export const unknown = (readings: UnknownRequest['readings'], changes: Partial<UnknownRequest> = {}) => ({
  readings,
  ...changes,
});

/** Points of x and y as standards of one reading each. */
export function standardsOf(x: readonly number[], y: readonly number[]) {
  return x.map((concentration, i) => ({ concentration, readings: [y[i] ?? NaN] }));
}

/** The result of one unknown on the plain curve, with changes to either. */
export function resultOf(
  readings: UnknownRequest['readings'],
  more: Partial<UnknownRequest> = {},
  changes: Partial<CurveRequest> = {},
) {
  const [result] = calculateStandardCurve(
    request({ unknowns: [unknown(readings, more)], ...changes }),
  ).unknowns;
  if (!result) throw new Error('no result');
  return result;
}
