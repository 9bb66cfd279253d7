import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { WorkingList } from '@/components/working/working-list';
import { calculateStandardCurve } from '@/lib/engine';
import { curveRequest } from '@/lib/curve/curve-request';
import { storedStandards } from '@/lib/curve/stored-standards';
import { parsedDraft } from '../../../support/curve-draft';

test('every line of the working is on the page, and every link leads to one of them', () => {
  const draft = parsedDraft();
  const { standards } = storedStandards(draft.standards, {
    signal: 'absorbance',
    pathLengthMm: 10,
    rule: draft.rule,
    spectra: new Map(),
  });
  const { working } = calculateStandardCurve(curveRequest(draft.calculation, standards)).curve;
  const html = renderToStaticMarkup(<WorkingList steps={working} prefix="curve" />);
  const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
  expect(ids.filter((id) => id?.startsWith('curve-'))).toHaveLength(working.length);
  const links = [...html.matchAll(/href="#([^"]+)"/g)].map(([, id]) => id);
  expect(links.length).toBeGreaterThan(5);
  expect(links.filter((link) => !ids.includes(link))).toEqual([]);
});
