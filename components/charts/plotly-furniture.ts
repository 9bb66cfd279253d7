import type { Layout } from 'plotly.js-dist-min';

import { paintColour, type Palette } from './chart-colour';
import { MARGIN, plotHeight, type ChartLabel, type ChartModel, type ChartRegion } from './chart-model';
import { plainText } from './plain-text';
import { ribbonBetween, VISIBLE_NM } from './visible-light';

type Shape = NonNullable<Layout['shapes']>[number];
type Annotation = NonNullable<Layout['annotations']>[number];
type Picture = NonNullable<Layout['images']>[number];

const SANS = "'IBM Plex Sans Variable', sans-serif";

/** An edge far outside what is shown, so that a region still reaches it when a person zooms out. */
function beyond(axis: { min: number; max: number }, side: 'low' | 'high'): number {
  const far = 20 * (axis.max - axis.min);
  return side === 'low' ? axis.min - far : axis.max + far;
}

export function plotlyShapes(model: ChartModel, palette: Palette): Partial<Shape>[] {
  const regions = model.regions.map((region): Partial<Shape> => {
    const axis = region.axis === 'x' ? model.x : model.y;
    const from = region.from ?? beyond(axis, 'low');
    const to = region.to ?? beyond(axis, 'high');
    const place =
      region.axis === 'x'
        ? { xref: 'x' as const, x0: from, x1: to, yref: 'paper' as const, y0: 0, y1: 1 }
        : { xref: 'paper' as const, x0: 0, x1: 1, yref: 'y' as const, y0: from, y1: to };
    return {
      type: 'rect',
      layer: 'below',
      line: { width: 0 },
      fillcolor: region.tone === 'stop' ? palette['red-wash'] : palette['amber-wash'],
      ...place,
    };
  });
  const guides = model.guides.flatMap((guide): Partial<Shape>[] => {
    const line = { color: paintColour(guide.colour, palette), width: 1, dash: 'dot' as const };
    return [
      { type: 'line', x0: beyond(model.x, 'low'), x1: guide.x, y0: guide.y, y1: guide.y, line },
      { type: 'line', x0: guide.x, x1: guide.x, y0: beyond(model.y, 'low'), y1: guide.y, line },
    ];
  });
  const markers = model.markers.flatMap((marker): Partial<Shape>[] => {
    const tall = { yref: 'paper' as const, y0: 0, y1: 1 };
    return [
      {
        type: 'rect',
        x0: marker.x - marker.halfWidth,
        x1: marker.x + marker.halfWidth,
        fillcolor: palette.uv,
        opacity: 0.18,
        line: { width: 0 },
        ...tall,
      },
      { type: 'line', x0: marker.x, x1: marker.x, line: { color: palette.uv, width: 1 }, ...tall },
    ];
  });
  return [...regions, ...guides, ...markers];
}

const SIDES: Record<ChartLabel['side'], Partial<Annotation>> = {
  right: { xanchor: 'left', yanchor: 'top', xshift: 6 },
  left: { xanchor: 'right', yanchor: 'bottom', xshift: -6 },
  'above-right': { xanchor: 'left', yanchor: 'bottom', xshift: 6 },
};

function regionSentence(region: ChartRegion, palette: Palette): Partial<Annotation> {
  const right = region.corner.endsWith('right');
  const top = region.corner === 'top-left';
  const edge = region.corner === 'edge-right';
  return {
    text: plainText(region.sentence),
    showarrow: false,
    xref: 'paper',
    yref: edge ? 'y' : 'paper',
    x: right ? 1 : 0,
    y: edge ? (region.from ?? 0) : top ? 1 : 0,
    xanchor: right ? 'right' : 'left',
    yanchor: top ? 'top' : 'bottom',
    xshift: right ? -3 : 3,
    borderpad: 1,
    bgcolor: edge ? 'rgba(0,0,0,0)' : palette[region.tone === 'stop' ? 'red-wash' : 'amber-wash'],
    font: { family: SANS, size: 11, color: region.tone === 'stop' ? palette.red : palette.amber },
  };
}

export function plotlyAnnotations(model: ChartModel, palette: Palette): Partial<Annotation>[] {
  const labels = model.labels.map((label): Partial<Annotation> => ({
    text: plainText(label.text),
    x: label.x,
    y: label.y,
    showarrow: false,
    font: { color: paintColour(label.colour, palette), size: 11 },
    ...SIDES[label.side],
  }));
  const markers = model.markers.map((marker): Partial<Annotation> => {
    const late = marker.x > model.x.min + 0.7 * (model.x.max - model.x.min);
    return {
      text: marker.label,
      x: marker.x,
      yref: 'paper',
      y: 1,
      yanchor: 'bottom',
      xanchor: late ? 'right' : 'left',
      xshift: late ? -3 : 3,
      showarrow: false,
      font: { color: palette.uv, size: 11 },
    };
  });
  const shown = model.regions.filter(({ axis, from, to }) => {
    const { min, max } = axis === 'x' ? model.x : model.y;
    return (from ?? min) < max && (to ?? max) > min;
  });
  const yLabel: Partial<Annotation> = {
    text: plainText(model.y.label),
    xref: 'paper',
    yref: 'paper',
    x: 0,
    y: 1,
    xanchor: 'left',
    yanchor: 'bottom',
    xshift: 6 - MARGIN.left,
    yshift: 4,
    showarrow: false,
    font: { family: SANS, size: 11, color: palette['ink-2'] },
  };
  return [...shown.map((region) => regionSentence(region, palette)), ...labels, ...markers, yLabel];
}

/** The whole ribbon as one picture in the axis' own nm: it moves and is cut with the axis when a person zooms. */
export function plotlyImages(model: ChartModel): Partial<Picture>[] {
  const ribbon = model.ribbon ? ribbonBetween(VISIBLE_NM.from, VISIBLE_NM.to) : null;
  if (!ribbon) return [];
  const stops = ribbon.stops
    .map(({ offset, colour }) => `<stop offset="${offset}" stop-color="${colour}"/>`)
    .join('');
  const svg =
    `<svg xmlns="http://www.w3.org/2000/svg" width="370" height="6" preserveAspectRatio="none" viewBox="0 0 370 6">` +
    `<linearGradient id="r">${stops}</linearGradient><rect width="370" height="6" fill="url(#r)"/></svg>`;
  const px = 1 / plotHeight(model);
  return [
    {
      source: `data:image/svg+xml,${encodeURIComponent(svg)}`,
      xref: 'x',
      yref: 'paper',
      x: ribbon.from,
      y: -4 * px,
      sizex: ribbon.to - ribbon.from,
      sizey: 6 * px,
      sizing: 'stretch',
      xanchor: 'left',
      yanchor: 'top',
      layer: 'above',
    },
  ];
}
