import { parseDecimal } from '@/lib/schemas/decimal';
import type { Signal } from '@/lib/engine';
import type { SpectrumPreview } from '@/lib/views/determination';
import type { SpectrumView } from '@/lib/views/spectrum';
import { sampleNameOf } from './group-replicates';
import { parseDilution } from './parse-dilution';
import type { UnknownSample } from './unknown-request';

/** What a person chose and wrote on the page where samples are made from spectra. */
export interface SpectrumChoice {
  /** In the order in which they were chosen. */
  readonly spectrumIds: readonly string[];
  /** The sample of a spectrum where it is not the one its name says. */
  readonly sampleOf: Readonly<Record<string, string>>;
  /** By sample name. */
  readonly dilutionOf: Readonly<Record<string, string>>;
  readonly pathLengthOf: Readonly<Record<string, string>>;
}

export const NOTHING_CHOSEN: SpectrumChoice = {
  spectrumIds: [],
  sampleOf: {},
  dilutionOf: {},
  pathLengthOf: {},
};

/** A sample as it stands on the page, before it is saved. */
export interface ChosenSample {
  readonly sample: string;
  readonly spectra: readonly SpectrumView[];
  readonly dilution: string;
  readonly pathLengthMm: string;
}

export function sampleOfSpectrum(choice: SpectrumChoice, spectrum: SpectrumView): string {
  return choice.sampleOf[spectrum.id] ?? sampleNameOf(spectrum.name);
}

/** The chosen spectra put together by sample; the path length is the file's, else that of the curve. */
export function chosenSamples(
  choice: SpectrumChoice,
  spectra: ReadonlyMap<string, SpectrumView>,
  curvePathMm: number,
): ChosenSample[] {
  const groups = new Map<string, SpectrumView[]>();
  for (const id of choice.spectrumIds) {
    const spectrum = spectra.get(id);
    if (!spectrum) continue;
    const sample = sampleOfSpectrum(choice, spectrum);
    groups.set(sample, [...(groups.get(sample) ?? []), spectrum]);
  }
  return [...groups].map(([sample, members]) => ({
    sample,
    spectra: members,
    dilution: choice.dilutionOf[sample] ?? '',
    pathLengthMm: choice.pathLengthOf[sample] ?? String(members[0]?.pathLengthMm ?? curvePathMm),
  }));
}

/** What the form sends. */
export function sentSamples(samples: readonly ChosenSample[]) {
  return samples.map(({ spectra, ...sample }) => ({ ...sample, spectrumIds: spectra.map(({ id }) => id) }));
}

const SIGNAL: Signal = 'absorbance';

/** The sample for the live calculation; null while something is missing or not understood. */
export function liveSample(
  { sample, spectra, dilution, pathLengthMm }: ChosenSample,
  read: ReadonlyMap<string, SpectrumPreview>,
): UnknownSample | null {
  const [path, steps] = [parseDecimal(pathLengthMm), parseDilution(dilution)];
  const readings = spectra.flatMap(({ id }) => {
    const one = read.get(id);
    return one && one.error === null
      ? [{ value: one.value, minusValue: one.minusValue, gapText: one.gapText, signal: SIGNAL }]
      : [];
  });
  if (!path.ok || path.value <= 0 || !steps.ok || readings.length < spectra.length || sample.trim() === '')
    return null;
  return { sample, readings, pathLengthMm: path.value, dilution: steps.steps };
}
