import type { Data, Layout } from 'plotly.js-dist-min';

import { paintColour, type Palette } from './chart-colour';
import { bottomMargin, MARGIN, type ChartDash, type ChartModel, type ChartPoint } from './chart-model';
import { plainText } from './plain-text';
import { plotlyAnnotations, plotlyImages, plotlyShapes } from './plotly-furniture';
import { ticksBetween } from './ticks';

export interface PlotlyFigure {
  data: Data[];
  layout: Partial<Layout>;
}

const DASH = { solid: 'solid', dashed: 'dash', dashdot: 'dashdot', dotted: 'dot' } as const satisfies Record<
  ChartDash,
  string
>;
const SYMBOL = { circle: 'circle', diamond: 'diamond', triangle: 'triangle-up' } as const;

/** The model as a Plotly figure: the same numbers, colours and places as the still picture. */
export function plotlyFigure(
  model: ChartModel,
  palette: Palette,
  options: { dragSelects: boolean },
): PlotlyFigure {
  return {
    data: [...bands(model, palette), ...lines(model, palette), ...points(model, palette)],
    layout: {
      height: model.height,
      autosize: true,
      margin: { t: MARGIN.top, r: MARGIN.right, b: bottomMargin(model), l: MARGIN.left },
      paper_bgcolor: 'rgba(0,0,0,0)',
      plot_bgcolor: 'rgba(0,0,0,0)',
      font: { family: "'IBM Plex Mono', monospace", size: 11, color: palette['ink-2'] },
      showlegend: false,
      hovermode: 'closest',
      hoverdistance: -1,
      hoverlabel: {
        bgcolor: palette.sheet,
        bordercolor: palette['rule-strong'],
        font: { family: "'IBM Plex Mono', monospace", size: 12, color: palette.ink },
        align: 'left',
      },
      dragmode: options.dragSelects ? 'select' : 'zoom',
      selectdirection: 'h',
      modebar: { bgcolor: 'rgba(0,0,0,0)', color: palette['ink-2'], activecolor: palette.uv },
      // keeps a person's zoom while the numbers under it change
      uirevision: model.title,
      // a band drawn by hand becomes the marker; Plotly's own frame around it goes
      selections: [],
      selectionrevision: JSON.stringify(model.markers),
      xaxis: axis(model.x, palette, 6, {
        title: model.x.label,
        standoff: model.ribbon ? 14 : 6,
        push: model.ribbon,
      }),
      yaxis: axis(model.y, palette, 5, { grid: true }),
      shapes: plotlyShapes(model, palette),
      annotations: plotlyAnnotations(model, palette),
      images: plotlyImages(model),
    },
  };
}

const CONFIG = {
  displaylogo: false,
  // Plotly's own button would upload the numbers to its maker's cloud
  showSendToCloud: false,
  responsive: true,
  toImageButtonOptions: { format: 'svg', filename: 'halflight-plot' },
  displayModeBar: 'hover',
  doubleClick: 'reset',
};

/** Two fixed objects: a new one would make Plotly build the plot again. */
export const PLOTLY_CONFIG = {
  zooming: { ...CONFIG, modeBarButtonsToRemove: ['lasso2d', 'autoScale2d', 'select2d'] },
  selecting: { ...CONFIG, modeBarButtonsToRemove: ['lasso2d', 'autoScale2d'] },
} satisfies Record<string, object>;

function axis(
  { min, max }: { min: number; max: number },
  palette: Palette,
  target: number,
  { title = '', standoff = 6, push = false, grid = false },
) {
  const { at, decimals } = ticksBetween(min, max, target);
  const step = (at[1] ?? 1) - (at[0] ?? 0);
  return {
    range: [min, max] as [number, number],
    title: {
      text: plainText(title),
      standoff,
      font: { family: "'IBM Plex Sans Variable', sans-serif", size: 11 },
    },
    nticks: Math.max(4, Math.round((max - min) / step) + 1),
    tickformat: `.${Math.min(decimals, 12)}f`,
    showgrid: grid,
    gridcolor: palette.grid,
    zeroline: false,
    ticks: push ? ('outside' as const) : ('' as const),
    ticklen: push ? 12 : 0,
    tickcolor: 'rgba(0,0,0,0)',
    fixedrange: false,
  };
}

function bands(model: ChartModel, palette: Palette): Data[] {
  return model.bands.map((band) => ({
    type: 'scatter',
    mode: 'lines',
    x: [...band.x, ...band.x.toReversed()],
    y: [...band.high, ...band.low.toReversed()],
    fill: 'toself',
    fillcolor: paintColour(band.colour, palette),
    line: { width: 0 },
    hoverinfo: 'skip',
  }));
}

function lines(model: ChartModel, palette: Palette): Data[] {
  return model.lines.map((line) => ({
    type: 'scatter',
    mode: 'lines',
    name: plainText(line.name),
    meta: line.id,
    x: [...line.x],
    y: [...line.y],
    customdata: line.hover?.extra ? [...line.hover.extra] : undefined,
    connectgaps: false,
    line: {
      color: paintColour(line.colour, palette),
      width: line.width,
      dash: DASH[line.dash],
      simplify: false,
    },
    ...(line.hover ? { hovertemplate: `${line.hover.template}<extra></extra>` } : { hoverinfo: 'skip' }),
  }));
}

/** All points are one trace, so that each can be picked by its id. */
function points(model: ChartModel, palette: Palette): Data[] {
  if (model.points.length === 0) return [];
  const each = <T>(read: (point: ChartPoint) => T) => model.points.map(read);
  return [
    {
      type: 'scatter',
      mode: 'markers',
      ids: each((point) => point.id),
      x: each((point) => point.x),
      y: each((point) => point.y),
      text: each((point) => plainText(point.hover).replaceAll('\n', '<br>')),
      hovertemplate: '%{text}<extra></extra>',
      cliponaxis: false,
      marker: {
        opacity: 1,
        size: each((point) => (point.chosen ? 14 : point.large ? 11.5 : 8.5)),
        symbol: each((point) => SYMBOL[point.shape]),
        color: each((point) => (point.hollow ? palette.sheet : paintColour(point.colour, palette))),
        line: {
          width: each((point) => (point.chosen ? 2.5 : point.hollow ? 1.5 : 1)),
          color: each((point) =>
            point.chosen ? palette.uv : point.hollow ? paintColour(point.colour, palette) : palette.sheet,
          ),
        },
      },
    },
  ];
}
