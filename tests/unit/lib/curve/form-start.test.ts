import { expect, test } from 'vitest';
import { formOf } from '@/lib/curve/form-start';
import { spectraStandards, typedSpec, typedStandards } from '@/lib/curve/grid-standards';
import { storedStandards } from '@/lib/curve/stored-standards';
import { gridOf } from '@/lib/grid/grid-state';
import { curveDraft, type CurveDraftInput } from '@/lib/schemas/curve';
import type { CurveView } from '@/lib/views/curve';
import type { SpectrumReadingView } from '@/lib/views/spectrum';
import { curveDraftInput } from '../../../support/curve-draft';

/** A saved curve as a page gets it, without its answer: the form does not look at that. */
function savedFrom(
  input: CurveDraftInput,
  spectra: ReadonlyMap<string, SpectrumReadingView> = new Map(),
): CurveView {
  const draft = curveDraft.parse(input);
  const { standards } = storedStandards(draft.standards, {
    signal: draft.calculation.signal,
    pathLengthMm: draft.calculation.pathLengthMm,
    rule: draft.rule,
    spectra,
  });
  const method = { ...draft.calculation, ...draft.about, readingRule: draft.rule, wavelengthNm: 510 };
  return { title: draft.about.title, method, standards } as unknown as CurveView; // what formOf reads of it
}

const formDraft = (curve: CurveView): CurveDraftInput => {
  const form = formOf(curve);
  const rows = gridOf(
    typedSpec('mg/L', 'A'),
    form.source === 'typed' ? form.rows : form.rows.map((row) => ['', ...row]),
  ).rows;
  const spelled =
    form.source === 'typed'
      ? typedStandards(rows, form.leftOut)
      : spectraStandards(rows, form.spectrumIds, form.leftOut);
  return {
    about: form.about,
    rule: form.rule,
    calculation: form.calculation,
    standards: [...spelled.standards],
  };
};

test('the form of a new version holds exactly what the version before was saved from', () => {
  const draft = curveDraftInput([
    ['B', 'blank', '0.01'],
    ['S1', '0.5', '0.1', 'OVER', '0.11'],
    ['S2', '1', '0.2'],
  ]);
  draft.about.title = 'Iron';
  Object.assign(draft.calculation, {
    blankRule: 'subtract',
    weighting: '1/x',
    standardsRelativeUPercent: '0.4',
    confidence: '0.99',
  });
  Object.assign(draft.standards[1]?.readings[2] ?? {}, { leftOut: 'bubble' });
  Object.assign(draft.standards[2] ?? {}, { leftOut: 'spilt' });
  expect(curveDraft.parse(formDraft(savedFrom(draft)))).toEqual(curveDraft.parse(draft));
});

test('a quadratic weighted by a variance function keeps both', () => {
  const draft = curveDraftInput([['S1', '1', '0.2']]);
  const changed = {
    model: 'quadratic',
    weighting: 'varianceFunction',
    varianceS0: '0.0006',
    varianceK: '0,004',
  };
  Object.assign(draft.calculation, changed);
  const { method } = savedFrom(draft);
  expect(method).toMatchObject({ model: 'quadratic', varianceFunction: { s0: 0.0006, k: 0.004 } });
  expect(curveDraft.parse(formDraft(savedFrom(draft)))).toEqual(curveDraft.parse(draft));
});

test('the same for standards read off spectra, in their order', () => {
  const ids = [crypto.randomUUID(), crypto.randomUUID(), crypto.randomUUID()];
  const spectra = new Map(
    ids.map((spectrumId) => [
      spectrumId,
      { spectrumId, name: 'x', value: 0.2, gapReason: null, gapText: null } as SpectrumReadingView,
    ]),
  );
  const draft = curveDraftInput([
    ['S1', '1'],
    ['S2', '2'],
  ]);
  draft.rule = { rule: 'bandMean', at: '510', half: '5', from: '', to: '', minus: '700' };
  draft.standards[0]?.readings.push(
    { spectrumId: ids[0] ?? '', leftOut: null },
    { spectrumId: ids[1] ?? '', leftOut: 'cloudy' },
  );
  draft.standards[1]?.readings.push({ spectrumId: ids[2] ?? '', leftOut: null });
  expect(curveDraft.parse(formDraft(savedFrom(draft, spectra)))).toEqual(curveDraft.parse(draft));
});
