import type { ChartColour, ChartDash } from './chart-model';

export type SpectrumRole = 'standard' | 'sample' | 'blank';

export interface SpectrumToDraw {
  id: string;
  role: SpectrumRole;
  /** of a standard, in any one unit */
  concentration?: number;
}

export interface SpectrumLook {
  colour: ChartColour;
  dash: ChartDash;
}

const SAMPLE_COLOURS = ['sample-1', 'sample-2', 'sample-3'] as const;
const SAMPLE_DASHES = ['dashed', 'dashdot'] as const;

/**
 * How each spectrum is drawn: standards light to dark violet in the order of their concentrations, samples dashed in
 * colours and dashes that tell six of them apart, blanks dotted. The table beside a plot takes its swatches from here.
 */
export function spectrumLooks(spectra: readonly SpectrumToDraw[]): Map<string, SpectrumLook> {
  const standards = spectra.filter((spectrum) => spectrum.role === 'standard');
  const levels = [...new Set(standards.map((spectrum) => spectrum.concentration ?? 0))].sort((a, b) => a - b);
  let sample = 0;
  return new Map(
    spectra.map((spectrum): [string, SpectrumLook] => {
      if (spectrum.role === 'blank') return [spectrum.id, { colour: 'control', dash: 'dotted' }];
      if (spectrum.role === 'standard') {
        const place =
          levels.length > 1 ? levels.indexOf(spectrum.concentration ?? 0) / (levels.length - 1) : 0.5;
        return [spectrum.id, { colour: { standard: place }, dash: 'solid' }];
      }
      const turn = sample++;
      const colour = SAMPLE_COLOURS[turn % SAMPLE_COLOURS.length] ?? 'ink';
      const dash = SAMPLE_DASHES[Math.floor(turn / SAMPLE_COLOURS.length) % SAMPLE_DASHES.length] ?? 'dashed';
      return [spectrum.id, { colour, dash }];
    }),
  );
}
