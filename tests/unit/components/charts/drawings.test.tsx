import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import path from 'node:path';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';

import { cssColour, paintColour, PALETTE_TOKENS, type Palette } from '@/components/charts/chart-colour';
import { CurveChart } from '@/components/charts/curve-chart';
import { PlaceOnCurve, placeOnRail } from '@/components/charts/place-on-curve';
import { PLOTLY_CONFIG, plotlyFigure } from '@/components/charts/plotly-figure';
import { SpectraChart } from '@/components/charts/spectra-chart';
import { spectraModel } from '@/components/charts/spectra-model';
import { curveModel } from '@/components/charts/curve-model';

const spectra = [
  {
    id: 'a',
    name: 'Drain <b>outfall</b>',
    role: 'sample' as const,
    wavelengthNm: [480, 500, 520],
    absorbance: [0.1, 2.4, 0.3],
  },
];
const palette = Object.fromEntries(
  PALETTE_TOKENS.map((token, i) => [token, `rgb(${i}, ${2 * i}, ${3 * i})`]),
) as Palette;
const curve = {
  points: [{ id: 'p', name: 'S1', concentration: 1, absorbance: 0.2, excluded: true }],
  line: { concentration: [0, 1], fitted: [0, 0.2] },
  range: { min: 1, max: 4 },
  unit: 'mg/L',
};

describe('colours', () => {
  test('are the same on the server and in Plotly: the ramp is mixed between its ends', () => {
    expect(cssColour({ standard: 0.25 })).toBe(
      'color-mix(in srgb, var(--color-standard-high) 25%, var(--color-standard-low))',
    );
    const ends = { ...palette, 'standard-low': 'rgb(200, 100, 0)', 'standard-high': 'rgb(0, 100, 200)' };
    expect(paintColour({ standard: 0.25 }, ends)).toBe('rgb(150, 100, 50)');
  });
  test('every colour of a plot exists in the stylesheet', () => {
    const css = readFileSync(fileURLToPath(new URL('../../../../app/globals.css', import.meta.url)), 'utf8');
    expect(PALETTE_TOKENS.filter((token) => !css.includes(`--color-${token}:`))).toEqual([]);
  });
});

describe('the Plotly figure', () => {
  const model = spectraModel({
    spectra,
    absorbanceLimit: 2,
    chosen: { atNm: 500, halfWidthNm: 0 },
    height: 400,
  });
  const figure = plotlyFigure(model, palette, { dragSelects: true });

  test('is made of scatter traces only: others need eval, which the policy of the pages forbids', () => {
    const both = [
      ...figure.data,
      ...plotlyFigure(curveModel({ ...curve, yLabel: 'A', unknowns: [], height: 300 }), palette, {
        dragSelects: false,
      }).data,
    ];
    expect(both.length).toBeGreaterThan(2);
    expect(both.map((trace) => trace.type)).toEqual(both.map(() => 'scatter'));
  });
  test('sends nothing to anybody', () => {
    for (const config of Object.values(PLOTLY_CONFIG)) {
      expect(config).toMatchObject({ showSendToCloud: false, displaylogo: false });
    }
  });
  test('shows a name as it was typed', () => {
    expect(figure.data[0]).toMatchObject({ name: 'Drain &lt;b&gt;outfall&lt;/b&gt;' });
  });
  test('carries the ribbon, the limit and the chosen wavelength', () => {
    expect(figure.layout.images).toHaveLength(1);
    expect(figure.layout.shapes?.length).toBe(3);
    const sentences = (figure.layout.annotations ?? []).map((each) => each.text);
    expect(sentences).toContain('above 2: under 1 % of light gets through');
    expect(sentences).toContain('500 nm');
  });
});

describe('on the server', () => {
  const html = renderToStaticMarkup(
    <SpectraChart
      spectra={spectra}
      chosen={{ atNm: 500, halfWidthNm: 0 }}
      onPickWavelength={() => undefined}
    />,
  );
  test('spectra are a picture with a name, a summary, and a slider for the keyboard', () => {
    expect(html).toContain('role="img"');
    expect(html).toContain('above 2: under 1 % of light gets through');
    expect(html).toContain('highest absorbance 2.400 at 500 nm');
    expect(html).toContain('aria-valuetext="500 nm"');
    expect(html).toContain('linearGradient');
    expect(html).not.toContain('NaN');
  });
  test('a curve has its points as a table, with a button for each when they can be picked', () => {
    expect(renderToStaticMarkup(<CurveChart {...curve} />)).toContain('left out');
    expect(renderToStaticMarkup(<CurveChart {...curve} />)).not.toContain('<button');
    expect(renderToStaticMarkup(<CurveChart {...curve} onPickPoint={() => undefined} />)).toContain(
      'aria-label="Choose S1, 0.2000"',
    );
  });
});

describe('PlaceOnCurve', () => {
  test('puts a value between the ends, and one beyond them at the end of the rail', () => {
    expect(placeOnRail(2.5, 1, 4)).toBe((placeOnRail(1, 1, 4) + placeOnRail(4, 1, 4)) / 2);
    expect(placeOnRail(400, 1, 4)).toBe(placeOnRail(4000, 1, 4));
    expect(placeOnRail(-400, 1, 4)).toBeLessThan(placeOnRail(1, 1, 4));
  });
  test.each([
    [2.5, 'Within the standards, 50 % of the way up'],
    [5, 'Above the top standard'],
    [0.2, 'Below the lowest standard'],
    [null, 'No place on the curve'],
  ])('says of %s: %s', (value, words) => {
    expect(renderToStaticMarkup(<PlaceOnCurve value={value} min={1} max={4} tone="order" />)).toContain(
      words,
    );
  });
});

test('Plotly is reached through one dynamic import only, so that a page without a plot never loads it', () => {
  const folder = fileURLToPath(new URL('../../../../components/charts', import.meta.url));
  const sources = readdirSync(folder).map((name) => ({
    name,
    text: readFileSync(path.join(folder, name), 'utf8'),
  }));
  const loads = sources.filter(({ text }) => /^import (?!type)[^;]*from '(plotly|react-plotly)/m.test(text));
  expect(loads.map(({ name }) => name)).toEqual(['plotly-plot.tsx']);
  const reaches = sources.filter(({ text }) => /^import (?!type)[^;]*'\.\/plotly-plot'/m.test(text));
  expect(reaches).toEqual([]);
  expect(sources.find(({ name }) => name === 'chart-view.tsx')?.text).toContain(
    "await import('./plotly-plot')",
  );
});
