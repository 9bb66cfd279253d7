import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { AbsorptivityDetail } from '@/components/absorptivity/absorptivity-detail';
import { AbsorptivityForm } from '@/components/absorptivity/absorptivity-form';
import { AbsorptivityTable } from '@/components/absorptivity/absorptivity-table';
import { YardstickSelect } from '@/components/batch/yardstick-select';
import { ResultsTable } from '@/components/batch/results-table';
import { WorkingList } from '@/components/working/working-list';
import { EMPTY_ABSORPTIVITY } from '@/lib/absorptivity/form-start';
import { absorptivityRequest, type StoredAbsorptivity } from '@/lib/absorptivity/stored-absorptivity';
import { resultFromKnownAbsorptivity } from '@/lib/engine';
import type { AbsorptivityView } from '@/lib/views/absorptivity';
import type { CurveVersionView } from '@/lib/views/curve';

const stored: StoredAbsorptivity = {
  analyte: 'Iron(II) as ferroin',
  basis: 'Fe',
  formulaMass: 55.845,
  unit: 'mg/L',
  signal: 'absorbance',
  kind: 'molar',
  value: 11100,
  u: null,
  source: 'analytical textbooks',
  conditions: '',
  wavelengthNm: 510,
  readingRule: { kind: 'point', wavelengthNm: 510 },
  pathLengthMm: 10,
  pathLengthUMm: null,
  readingSd: null,
  confidence: 0.95,
  absorbanceLimit: 2,
  hazardNote: '',
};
const request = absorptivityRequest(stored);
const { flags, working, unknowns } = resultFromKnownAbsorptivity({
  ...request,
  unknowns: [{ name: 'Weir 3', readings: [0.198, 0.1996] }],
});
const version: CurveVersionView = {
  id: 'a1',
  version: 1,
  status: 'superseded',
  createdAt: '2026-12-01T09:00:00.000Z',
  createdBy: 'Odile Marchetti',
  reason: null,
  voidReason: null,
};
const VIEW: AbsorptivityView = {
  ...stored,
  ...version,
  ...{ notebookId: 'n1', lineageId: 'a1', title: 'Iron, 510 nm', newer: { id: 'a2', version: 2 } },
  ...{ request, flags, working, versions: [version], mayEdit: true },
};

test('the page says value, source, what it means, and what is missing', () => {
  const html = renderToStaticMarkup(<AbsorptivityDetail of={VIEW} timeZone="UTC" />);
  for (const said of [
    'analytical textbooks',
    'A = 0.5 in 10 mm would mean 2.516 mg/L as Fe',
    'ABSORPTIVITY_WITHOUT_U',
    'ABSORPTIVITY_WITHOUT_CONDITIONS',
    'No standards were measured',
    '/notebooks/n1/absorptivities/a2',
  ])
    expect(html).toContain(said);
});

test('the list names source and unit', () => {
  const html = renderToStaticMarkup(
    <AbsorptivityTable label="Known absorptivities" absorptivities={[VIEW]} timeZone="UTC" />,
  );
  expect(html).toContain('href="/notebooks/n1/absorptivities/a1"');
  expect(html).toContain('mg/L as Fe');
});

test('the form stands without JavaScript: every field has its name, and the source is asked for', () => {
  const html = renderToStaticMarkup(
    <AbsorptivityForm
      notebookId="n1"
      saveKey="key of a form"
      start={EMPTY_ABSORPTIVITY}
      save={async () => ({ status: 'idle' })}
    />,
  );
  const names = [...html.matchAll(/ name="([^"]+)"/g)].map(([, name]) => name);
  for (const name of ['analyte', 'unit', 'formulaMass', 'kind', 'value', 'u', 'source', 'conditions', 'rule'])
    expect(names).toContain(name);
  for (const name of [
    'at',
    'pathLengthMm',
    'signal',
    'confidence',
    'absorbanceLimit',
    'notebookId',
    'saveKey',
  ])
    expect(names).toContain(name);
  expect(html).toContain('Enter the absorptivity, and this line says');
});

test('results without standards have no place on a curve', () => {
  const [result] = unknowns;
  if (!result) throw new Error('the sample has a result');
  const row = { key: '1', sample: 'Weir 3', readings: [], pathLengthMm: 10, dilution: [], result };
  const method = { ...stored, range: null };
  const html = renderToStaticMarkup(<ResultsTable label="Results" method={method} rows={[row]} />);
  expect(html).not.toContain('Place on the curve');
  expect(html).toContain('By the known absorptivity');
});

test('every line of a result links to lines that are there', () => {
  const steps = unknowns[0]?.working ?? [];
  const html = renderToStaticMarkup(
    <>
      <WorkingList steps={steps} prefix="result" behind={working} />
      <WorkingList steps={working} prefix="result" />
    </>,
  );
  const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
  const links = [...html.matchAll(/href="#([^"]+)"/g)].map(([, id]) => id);
  expect(links.length).toBeGreaterThan(3);
  expect(links.filter((link) => !ids.includes(link))).toEqual([]);
});

test('one kind to choose from is named by the label, two are named in the list', () => {
  const choice = { ...VIEW, kind: 'absorptivity' as const, status: 'saved' as const, newer: null };
  const select = (choices: readonly (typeof choice | (Omit<typeof choice, 'kind'> & { kind: 'curve' }))[]) =>
    renderToStaticMarkup(
      <YardstickSelect choices={choices} value="absorptivity a1" onChange={() => undefined} />,
    );
  expect(select([choice])).toContain('>Known absorptivity<');
  const both = select([{ ...choice, kind: 'curve' }, choice]);
  expect(both).toContain('>Read on<');
  expect(both).toContain('Known absorptivity: Iron, 510 nm, version 1');
});
