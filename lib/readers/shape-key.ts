import type { ReadSpectrum } from './types';

/**
 * A short key of what makes files alike: the reader's name and 64 bits over the parts (FNV-1a, from both of its usual
 * offsets). Equal parts give equal keys on every machine; nothing is to be read from a key.
 */
export function shapeKey(reader: string, parts: readonly string[]): string {
  const text = parts.join('\u001f').slice(0, LONGEST);
  let [a, b] = [0x811c9dc5, 0x050c5d1f];
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    a = Math.imul(a ^ code, 0x01000193);
    b = Math.imul(b ^ code, 0x01000193) ^ (b >>> 13);
  }
  return `${reader}-${hex(a)}${hex(b)}`;
}

/** A heading longer than this is like another that begins so. */
const LONGEST = 20_000;

const hex = (word: number): string => (word >>> 0).toString(16).padStart(8, '0');

/** Units and words of the spectra, each kind once: they tell files of one program apart that measured different things. */
export function spectrumWords(spectra: readonly ReadSpectrum[]): string[] {
  return [
    ...new Set(spectra.map((spectrum) => `${spectrum.xUnit} ${spectrum.signal} ${spectrum.signalText}`)),
  ].sort();
}
