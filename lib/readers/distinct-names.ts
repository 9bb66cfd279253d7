import type { ReadSpectrum } from './types';

/** Spectra of one file with the same name get a number behind it. */
export function distinctNames(spectra: readonly ReadSpectrum[]): ReadSpectrum[] {
  const taken = new Set<string>();
  const last = new Map<string, number>();
  return spectra.map((spectrum) => {
    let { name } = spectrum;
    let number = last.get(spectrum.name) ?? 1;
    while (taken.has(name)) {
      number += 1;
      name = `${spectrum.name} (${number})`;
    }
    last.set(spectrum.name, number);
    taken.add(name);
    return name === spectrum.name ? spectrum : { ...spectrum, name };
  });
}
