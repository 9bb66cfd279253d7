import type { ChartLabel, ChartMarker, ChartModel, ChartRegion } from './chart-model';
import { MARGIN } from './chart-model';
import { placeLabels } from './place-labels';
import { spectrumLooks, type SpectrumRole } from './spectrum-look';
import { axisAround } from './ticks';

export interface PlottedSpectrum {
  id: string;
  name: string;
  /** ascending */
  wavelengthNm: readonly number[];
  /** as it came or as worked on, the page says which; null is a gap */
  absorbance: readonly (number | null)[];
  role: SpectrumRole;
  concentration?: number;
}

/** The wavelength or band that is read. */
export interface ChosenBand {
  atNm: number;
  halfWidthNm: number;
}

export interface SpectraModelInput {
  spectra: readonly PlottedSpectrum[];
  absorbanceLimit: number;
  chosen?: ChosenBand;
  /** shows only this part */
  rangeNm?: { from: number; to: number };
  height: number;
}

const USUAL_PLOT_WIDTH_PX = 700;
const NARROW_PLOT_WIDTH_PX = 290;
const LETTER_PX = 6.6;

/** Px between the y axis and a wavelength on a telephone, the narrowest place a plot is read in. */
function roomLeft(nm: number, x: { min: number; max: number }): number {
  return (NARROW_PLOT_WIDTH_PX * (nm - x.min)) / (x.max - x.min);
}

/** Spectra over each other, with the region above the absorbance limit and the chosen wavelength. */
export function spectraModel({
  spectra,
  absorbanceLimit,
  chosen,
  rangeNm,
  height,
}: SpectraModelInput): ChartModel {
  const looks = spectrumLooks(spectra);
  const from = rangeNm?.from ?? Math.min(...spectra.map((s) => s.wavelengthNm[0] ?? Infinity));
  const to = rangeNm?.to ?? Math.max(...spectra.map((s) => s.wavelengthNm.at(-1) ?? -Infinity));
  const x = from < to ? { min: from, max: to } : { min: 380, max: 750 };
  const peaks = spectra.map((spectrum) => peakWithin(spectrum, x.min, x.max));
  const known = peaks.flatMap((peak) => (peak ? [peak.lowest, peak.highest] : []));
  const y = axisAround([0, 0.05, ...known], { below: 0.02, above: 0.08 });
  const labels = peaks.flatMap((peak, i): ChartLabel[] => {
    const spectrum = spectra[i];
    if (!peak || !spectrum || spectrum.role === 'blank') return [];
    const colour = looks.get(spectrum.id)?.colour ?? 'ink';
    const text = shortName(spectrum.name);
    const side = roomLeft(peak.atNm, x) > text.length * LETTER_PX + 12 ? 'left' : 'above-right';
    return [{ x: peak.atNm, y: peak.highest, text, colour, side }];
  });
  return {
    title:
      spectra.length === 1 ? `Spectrum of ${spectra[0]?.name}` : `Spectra of ${spectra.length} solutions`,
    summary: summary(spectra, peaks, absorbanceLimit),
    x: { label: 'wavelength, nm', ...x },
    y: { label: 'absorbance', ...y },
    bands: [],
    regions: y.max > absorbanceLimit ? [aboveLimit(absorbanceLimit)] : [],
    lines: spectra.map((spectrum) => {
      const look = looks.get(spectrum.id) ?? { colour: 'ink' as const, dash: 'solid' as const };
      return {
        id: spectrum.id,
        name: spectrum.name,
        x: spectrum.wavelengthNm,
        y: spectrum.absorbance,
        ...look,
        width: spectrum.role === 'standard' ? 1.7 : 2,
        hover: {
          template: '<b>%{fullData.name}</b><br>%{x:.1f} nm   A %{y:.4f}<br>%{customdata:.1f} % of the light',
          extra: spectrum.absorbance.map((a) => (a === null ? null : 100 * 10 ** -a)),
        },
      };
    }),
    points: [],
    markers: chosen ? [marker(chosen)] : [],
    guides: [],
    labels:
      spectra.length > 12
        ? []
        : placeLabels(
            labels.toSorted((a, b) => b.y - a.y),
            (height - MARGIN.top - MARGIN.bottomWithRibbon) / (y.max - y.min),
            USUAL_PLOT_WIDTH_PX / (x.max - x.min),
          ),
    ribbon: true,
    height,
  };
}

function aboveLimit(limit: number): ChartRegion {
  const percent = Number((100 * 10 ** -limit).toPrecision(2));
  return {
    id: 'above-limit',
    axis: 'y',
    from: limit,
    to: null,
    tone: 'stop',
    sentence: `above ${limit}: under ${percent} % of light gets through`,
    corner: 'edge-right',
  };
}

function marker({ atNm, halfWidthNm }: ChosenBand): ChartMarker {
  const width = halfWidthNm > 0 ? ` ± ${halfWidthNm}` : '';
  return { x: atNm, halfWidth: halfWidthNm, label: `${atNm}${width} nm` };
}

interface Peak {
  atNm: number;
  highest: number;
  lowest: number;
}

function peakWithin(spectrum: PlottedSpectrum, from: number, to: number): Peak | null {
  let peak: Peak | null = null;
  spectrum.wavelengthNm.forEach((nm, i) => {
    const a = spectrum.absorbance[i] ?? null;
    if (a === null || nm < from || nm > to) return;
    if (!peak) peak = { atNm: nm, highest: a, lowest: a };
    else if (a > peak.highest) peak = { ...peak, atNm: nm, highest: a };
    else if (a < peak.lowest) peak = { ...peak, lowest: a };
  });
  return peak;
}

function shortName(name: string): string {
  return name.length > 18 ? `${name.slice(0, 17)}…` : name;
}

function summary(
  spectra: readonly PlottedSpectrum[],
  peaks: readonly (Peak | null)[],
  limit: number,
): string {
  const sentences = spectra.map((spectrum, i) => {
    const peak = peaks[i];
    if (!peak) return `${spectrum.name}: no reading in this range.`;
    const above = peak.highest > limit ? `, above the limit of ${limit}` : '';
    return `${spectrum.name}: highest absorbance ${peak.highest.toFixed(3)} at ${peak.atNm} nm${above}.`;
  });
  return `Absorbance over wavelength. ${sentences.slice(0, 20).join(' ')}`;
}
