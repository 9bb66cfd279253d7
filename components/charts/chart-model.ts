/**
 * One plot, said once: numbers and words, with no drawing library in them. `static-chart.tsx` draws it as SVG on the
 * server and for print; `plotly-figure.ts` turns the same into a figure that can be hovered and zoomed.
 */
export interface ChartModel {
  /** its name for those who do not see it */
  title: string;
  /** in sentences, what can be read off it */
  summary: string;
  x: ChartAxis;
  y: ChartAxis;
  bands: readonly ChartBand[];
  regions: readonly ChartRegion[];
  lines: readonly ChartLine[];
  points: readonly ChartPoint[];
  markers: readonly ChartMarker[];
  guides: readonly ChartGuide[];
  labels: readonly ChartLabel[];
  /** draws the visible colours under an x axis in nm */
  ribbon: boolean;
  height: number;
}

export interface ChartAxis {
  label: string;
  min: number;
  max: number;
}

/** A colour of globals.css, or a place on the violet ramp of the standards (0 the lightest, 1 the darkest). */
export type ChartColour =
  | 'ink'
  | 'ink-2'
  | 'control'
  | 'uv'
  | 'amber'
  | 'red'
  | 'verdigris'
  | 'band'
  | 'band-wide'
  | 'sample-1'
  | 'sample-2'
  | 'sample-3'
  | { standard: number };

export type ChartDash = 'solid' | 'dashed' | 'dashdot' | 'dotted';
export type ChartShape = 'circle' | 'diamond' | 'triangle';

export interface ChartLine {
  id: string;
  name: string;
  x: readonly number[];
  /** null is a gap; nothing is drawn across it */
  y: readonly (number | null)[];
  colour: ChartColour;
  dash: ChartDash;
  width: number;
  /** Plotly's hover template, with %{customdata} from `extra`; without one the line stays silent */
  hover?: { template: string; extra?: readonly (number | null)[] };
}

export interface ChartPoint {
  id: string;
  name: string;
  x: number;
  y: number;
  colour: ChartColour;
  shape: ChartShape;
  /** left out of the fit, still shown */
  hollow?: boolean;
  /** an unknown, drawn larger than a standard */
  large?: boolean;
  chosen?: boolean;
  hover: string;
}

export interface ChartBand {
  name: string;
  x: readonly number[];
  low: readonly number[];
  high: readonly number[];
  colour: ChartColour;
}

/** A part of the plot where numbers are not to be trusted, with the sentence that says why. */
export interface ChartRegion {
  id: string;
  axis: 'x' | 'y';
  /** null reaches to the edge */
  from: number | null;
  to: number | null;
  tone: 'decide' | 'stop';
  sentence: string;
  /** where the sentence stands: a corner of the plot, or at the right just above the region's lower edge */
  corner: 'top-left' | 'bottom-right' | 'edge-right';
}

/** A vertical line at a chosen x, as wide as the band read there. */
export interface ChartMarker {
  x: number;
  halfWidth: number;
  label: string;
}

/** An unknown on the curve: from the y axis to the line and down to the x axis. */
export interface ChartGuide {
  id: string;
  x: number;
  y: number;
  colour: ChartColour;
}

export interface ChartLabel {
  x: number;
  y: number;
  text: string;
  colour: ChartColour;
  side: 'right' | 'left' | 'above-right';
}

/** Space around the plot, in px: the same for both drawings, so that nothing jumps when one replaces the other. */
export const MARGIN = { top: 26, right: 16, bottom: 46, bottomWithRibbon: 60, left: 50 } as const;

export function bottomMargin(model: Pick<ChartModel, 'ribbon'>): number {
  return model.ribbon ? MARGIN.bottomWithRibbon : MARGIN.bottom;
}

export function plotHeight(model: Pick<ChartModel, 'ribbon' | 'height'>): number {
  return model.height - MARGIN.top - bottomMargin(model);
}
