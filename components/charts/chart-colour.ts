import type { ChartColour } from './chart-model';

/** Every colour a plot may ask for, by its name in globals.css. */
export const PALETTE_TOKENS = [
  'ink',
  'ink-2',
  'control',
  'uv',
  'amber',
  'red',
  'verdigris',
  'band',
  'band-wide',
  'sample-1',
  'sample-2',
  'sample-3',
  'standard-low',
  'standard-high',
  'sheet',
  'grid',
  'rule-strong',
  'red-wash',
  'amber-wash',
] as const;

export type Palette = Record<(typeof PALETTE_TOKENS)[number], string>;

/** The colour as CSS, for SVG that follows the theme by itself. */
export function cssColour(colour: ChartColour): string {
  if (typeof colour === 'string') return `var(--color-${colour})`;
  const share = Math.round(100 * clamp(colour.standard));
  return `color-mix(in srgb, var(--color-standard-high) ${share}%, var(--color-standard-low))`;
}

/** The colour as rgb(…), for a drawing library that knows no CSS variables. The ramp is mixed as CSS mixes it. */
export function paintColour(colour: ChartColour, palette: Palette): string {
  if (typeof colour === 'string') return palette[colour];
  const share = clamp(colour.standard);
  const low = channels(palette['standard-low']);
  const high = channels(palette['standard-high']);
  return `rgb(${low.map((value, i) => Math.round(value + (high[i]! - value) * share)).join(', ')})`; // both have three
}

function channels(rgb: string): number[] {
  const found = (rgb.match(/[\d.]+/g) ?? []).slice(0, 3).map(Number);
  return found.length === 3 ? found : [0, 0, 0];
}

function clamp(value: number): number {
  return Math.min(1, Math.max(0, value));
}
