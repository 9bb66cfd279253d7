/** A spectrum that is to be read for a sample. */
export interface NamedSpectrum {
  readonly id: string;
  readonly name: string;
}

export interface ReplicateGroup {
  readonly sample: string;
  readonly spectrumIds: readonly string[];
}

const ENDINGS = [
  /^(.*\S)\s*\(\d+\)$/,
  /^(.*\S)\s*\[\d+\]$/,
  /^(.*\S)\s*#\d+$/,
  /^(.*\S)[\s_-]+(?:rep|r|replicate|reading|run|scan)\s*\d+$/i,
];

/** The sample a spectrum belongs to by its name: "S01 (2)", "S01 #2" and "S01_rep2" are replicates of S01. */
export function sampleNameOf(spectrumName: string): string {
  const name = spectrumName.trim().replace(/\.(csv|txt|tsv|dat|dx|jdx|jcm)$/i, '');
  for (const ending of ENDINGS) {
    const sample = ending.exec(name)?.[1];
    if (sample) return sample;
  }
  return name;
}

/** Put replicates together by name, in the order in which each sample first comes. */
export function groupReplicates(spectra: readonly NamedSpectrum[]): ReplicateGroup[] {
  const groups = new Map<string, string[]>();
  for (const spectrum of spectra) {
    const sample = sampleNameOf(spectrum.name);
    groups.set(sample, [...(groups.get(sample) ?? []), spectrum.id]);
  }
  return [...groups].map(([sample, spectrumIds]) => ({ sample, spectrumIds }));
}
