import type { ChartColour, ChartLabel, ChartModel, ChartRegion, ChartShape } from './chart-model';
import { MARGIN } from './chart-model';
import { placeLabels } from './place-labels';
import { axisAround } from './ticks';

export interface CurvePoint {
  id: string;
  name: string;
  concentration: number;
  /** as fitted: after blank, per 10 mm */
  absorbance: number;
  excluded?: boolean;
  /** one more line for whoever hovers: why it was left out, its error */
  note?: string;
}

/** The fitted line and its bands over a grid of concentrations, all of one length. */
export interface CurveLine {
  concentration: readonly number[];
  fitted: readonly number[];
  confidence?: { low: readonly number[]; high: readonly number[] };
  prediction?: { low: readonly number[]; high: readonly number[] };
}

export type UnknownTone = 'order' | 'decide' | 'stop';

export interface CurveUnknown {
  id: string;
  name: string;
  /** in the measured solution */
  concentration: number;
  absorbance: number;
  /** what stands beside it, for instance "Weir 3: 2.01 ± 0.04 mg/L" */
  label?: string;
  tone: UnknownTone;
}

export interface CurveModelInput {
  points: readonly CurvePoint[];
  line: CurveLine | null;
  /** lowest standard above zero, and highest, of those in the fit */
  range?: { min: number; max: number };
  unit: string;
  yLabel: string;
  unknowns: readonly CurveUnknown[];
  chosenPointId?: string;
  height: number;
}

export const TONE_LOOK: Record<UnknownTone, { colour: ChartColour; shape: ChartShape }> = {
  order: { colour: 'verdigris', shape: 'circle' },
  decide: { colour: 'amber', shape: 'diamond' },
  stop: { colour: 'red', shape: 'triangle' },
};

const USUAL_PLOT_WIDTH_PX = 500;

/** A standard curve: points, line, bands, what lies outside the standards, unknowns with their guides. */
export function curveModel(input: CurveModelInput): ChartModel {
  const { points, line, range, unit, unknowns, height } = input;
  const x = axisAround([0, ...points.map((p) => p.concentration), ...unknowns.map((u) => u.concentration)]);
  const y = axisAround([
    0,
    ...points.map((p) => p.absorbance),
    ...unknowns.map((u) => u.absorbance),
    ...(line?.fitted.filter((_, i) => (line.concentration[i] ?? Infinity) <= x.max) ?? []),
  ]);
  return {
    title: 'Standard curve',
    summary: summary(input),
    x: { label: `concentration, ${unit}`, ...x },
    y: { label: input.yLabel, ...y },
    bands: bandsOf(line),
    regions: range ? outside(range) : [],
    lines: line ? [fitted(line)] : [],
    points: [...points.map((point) => standardMark(point, input)), ...unknowns.map(unknownMark)],
    markers: [],
    guides: unknowns.map((u) => ({
      id: u.id,
      x: u.concentration,
      y: u.absorbance,
      colour: TONE_LOOK[u.tone].colour,
    })),
    labels: placeLabels(
      unknowns.flatMap((u) => unknownLabel(u, (x.min + x.max) / 2)),
      (height - MARGIN.top - MARGIN.bottom) / (y.max - y.min),
      USUAL_PLOT_WIDTH_PX / (x.max - x.min),
    ),
    ribbon: false,
    height,
  };
}

function fitted(line: CurveLine) {
  const solid = { colour: 'uv', dash: 'solid', width: 1.8 } as const;
  return { id: 'fit', name: 'fitted line', x: line.concentration, y: line.fitted, ...solid };
}

function bandsOf(line: CurveLine | null) {
  if (!line) return [];
  const band = (name: string, colour: ChartColour, limits?: CurveLine['confidence']) =>
    limits ? [{ name, x: line.concentration, ...limits, colour }] : [];
  return [
    ...band('95 % prediction', 'band-wide', line.prediction),
    ...band('95 % confidence', 'band', line.confidence),
  ];
}

function outside({ min, max }: { min: number; max: number }): ChartRegion[] {
  return [
    {
      id: 'below',
      axis: 'x',
      from: null,
      to: min,
      tone: 'decide',
      sentence: 'below the lowest standard',
      corner: 'top-left',
    },
    {
      id: 'above',
      axis: 'x',
      from: max,
      to: null,
      tone: 'stop',
      sentence: 'above the top standard',
      corner: 'bottom-right',
    },
  ];
}

function standardMark(point: CurvePoint, { unit, chosenPointId }: CurveModelInput) {
  const state = point.excluded ? 'left out of the fit' : undefined;
  return {
    id: point.id,
    name: point.name,
    x: point.concentration,
    y: point.absorbance,
    colour: point.excluded ? ('ink-2' as const) : ('ink' as const),
    shape: 'circle' as const,
    hollow: point.excluded,
    chosen: point.id === chosenPointId,
    hover: [
      `${point.name}, ${point.concentration} ${unit}`,
      `A ${point.absorbance.toFixed(4)}`,
      state,
      point.note,
    ]
      .filter(Boolean)
      .join('\n'),
  };
}

function unknownMark(unknown: CurveUnknown) {
  return {
    id: unknown.id,
    name: unknown.name,
    x: unknown.concentration,
    y: unknown.absorbance,
    ...TONE_LOOK[unknown.tone],
    large: true,
    hover: `${unknown.label ?? unknown.name}\nA ${unknown.absorbance.toFixed(4)}`,
  };
}

function unknownLabel(unknown: CurveUnknown, middle: number): ChartLabel[] {
  if (!unknown.label) return [];
  const side = unknown.concentration > middle ? 'left' : 'right';
  const { colour } = TONE_LOOK[unknown.tone];
  return [{ x: unknown.concentration, y: unknown.absorbance, text: unknown.label, colour, side }];
}

function summary({ points, range, unit, unknowns, yLabel }: CurveModelInput): string {
  const out = points.filter((point) => point.excluded).length;
  const fit = `${points.length - out} readings in the fit${out ? `, ${out} left out` : ''}`;
  const span = range ? `, standards from ${range.min} to ${range.max} ${unit}` : '';
  const read = unknowns.slice(0, 20).map((unknown) => `${unknown.label ?? unknown.name}.`);
  return `${yLabel} over concentration: ${fit}${span}. ${read.join(' ')}`.trim();
}
