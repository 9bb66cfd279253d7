import { describe, expect, test } from 'vitest';
import { curveRequest } from '@/lib/curve/curve-request';
import { storedStandards } from '@/lib/curve/stored-standards';
import type { CurveDraftInput } from '@/lib/schemas/curve';
import type { SpectrumReadingView } from '@/lib/views/spectrum';
import { curveDraftInput, parsedDraft } from '../../../support/curve-draft';

function requestOf(input: CurveDraftInput, spectra: ReadonlyMap<string, SpectrumReadingView> = new Map()) {
  const draft = parsedDraft(input);
  const { standards, refusals } = storedStandards(draft.standards, {
    signal: draft.calculation.signal,
    pathLengthMm: draft.calculation.pathLengthMm,
    rule: draft.rule,
    spectra,
  });
  return { request: curveRequest(draft.calculation, standards), refusals };
}

const ROWS = [
  ['Blank', 'blank', '0.01', '0.02'],
  ['S1', '1', '0.2', '0.21'],
  ['S2', '2', '0.4', 'OVER'],
] as const;
const withBlank = (blankRule: 'none' | 'level' | 'subtract') => {
  const draft = curveDraftInput(ROWS);
  return { ...draft, calculation: { ...draft.calculation, blankRule } };
};

describe('curveRequest', () => {
  test('blanks go where the blank rule sends them, and are never a standard', () => {
    expect(requestOf(withBlank('none')).request.blank).toBeUndefined();
    expect(requestOf(withBlank('subtract')).request.blank).toEqual({
      use: 'subtract',
      readings: [0.01, 0.02],
    });
    expect(requestOf(withBlank('level')).request.standards.map(({ name }) => name)).toEqual(['S1', 'S2']);
  });

  test('a blank reading left out takes no part', () => {
    const draft = withBlank('subtract');
    Object.assign(draft.standards[0]?.readings[1] ?? {}, { leftOut: 'bubble' });
    expect(requestOf(draft).request.blank?.readings).toEqual([0.01]);
  });

  test('text that stands for a reading reaches the engine as it came', () => {
    expect(requestOf(withBlank('none')).request.standards[1]?.readings).toEqual([0.4, 'OVER']);
  });

  test('what is left out is told by position', () => {
    const draft = withBlank('none');
    Object.assign(draft.standards[1] ?? {}, { leftOut: 'spilt' });
    Object.assign(draft.standards[2]?.readings[0] ?? {}, { leftOut: 'bubble' });
    const [s1, s2] = requestOf(draft).request.standards;
    expect([s1?.excluded, s2?.excluded, s2?.excludedReadings]).toEqual([true, undefined, [0]]);
  });

  test('a spectrum read in absorbance enters a curve typed in per cent T as per cent T', () => {
    const spectrumId = crypto.randomUUID();
    const read = { spectrumId, name: 'a', value: 1, gapReason: null, gapText: null } as SpectrumReadingView;
    const draft = curveDraftInput([['S1', '1']]);
    draft.standards[0]?.readings.push({ spectrumId, leftOut: null });
    const input = {
      ...draft,
      calculation: { ...draft.calculation, signal: 'percentTransmittance' as const },
    };
    // A = 1 lets a tenth of the light through: 10 %, by A = -log10 T
    expect(requestOf(input, new Map([[spectrumId, read]])).request.standards[0]?.readings[0]).toBeCloseTo(
      10,
      12,
    );
  });
});

describe('storedStandards', () => {
  test('refuses what is neither a number nor what an instrument shows, at its place', () => {
    const { refusals } = requestOf(
      curveDraftInput([
        ['S1', '1', '0.2', '0.x3'],
        ['S2', '2', '1,234'],
      ]),
    );
    expect(refusals.map(({ path }) => path)).toEqual(['standards.0.readings.1', 'standards.1.readings.0']);
    expect(refusals[1]?.message).toMatch(/1\.234 or 1234/);
  });

  test('refuses a wavelength outside the spectrum with the sentence of the reader', () => {
    const spectrumId = crypto.randomUUID();
    const read = {
      spectrumId,
      name: 'S1.csv',
      value: null,
      error: '900 nm lies outside 400 to 700 nm',
    } as SpectrumReadingView;
    const draft = curveDraftInput([['S1', '1']]);
    draft.standards[0]?.readings.push({ spectrumId, leftOut: null });
    expect(requestOf(draft, new Map([[spectrumId, read]])).refusals).toEqual([
      { path: 'standards.0.readings.0', message: 'S1.csv: 900 nm lies outside 400 to 700 nm' },
    ]);
  });
});
