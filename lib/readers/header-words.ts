import type { SignalKind, XUnit } from './types';

/** Words beyond this are no label any more; what is looked for in a label is looked for in so much of it. */
const LONGEST_LABEL = 300;

/** So much of a text as may be a label, with runs of blanks made one, which keeps every pattern below in step with it. */
function labelOf(text: string): string {
  const start = text.length > LONGEST_LABEL ? text.slice(0, LONGEST_LABEL) : text;
  return start.includes('  ') ? start.replace(/ {2,}/g, ' ') : start;
}

/** Unit of x as a header words it, or undefined when the words name none. */
export function xUnitFromText(label: string): XUnit | undefined {
  const text = labelOf(label);
  const word = text.toLowerCase().replace(/[_\u00a0]/g, ' ');
  if (
    /(?:^|[^a-z\d])(?:1\s*\/\s*cm|cm\s*\^?\s*[-\u2212\u207b]\s*[1\u00b9]|cm\^\(-1\)|wave\s?numbers?|wellenzahl|kayser)(?![a-z\d])/.test(
      word,
    )
  )
    return '1/cm';
  if (/(?:^|[^a-z\d])(?:nm|nanom(?:et(?:er|re)s?|\.)?)(?![a-z\d])/.test(word)) return 'nm';
  if (
    /(?:^|[^a-z\d])(?:um|[\u00b5\u03bc]m|microns?|microm(?:et(?:er|re)s?)?|mikrom(?:eter)?)(?![a-z\d])/.test(
      word,
    )
  )
    return 'um';
  if (
    /(?:\u00e5|\u212b|(?:^|[^a-z\d])(?:angstr(?:o|\u00f6)ms?|\u00e5ngstr(?:o|\u00f6)ms?|aa|a\u030a)(?![a-z\d]))/.test(
      word,
    )
  )
    return 'angstrom';
  if (/[([/,]\s*A\s*[)\]]?\s*$/.test(text) && isWavelengthWord(text)) return 'angstrom';
  if (/(?:^|[^a-z\d])(?:ev|electron\s?volts?)(?![a-z\d])/.test(word)) return 'eV';
  return undefined;
}

/** Whether the words name a wavelength, wavenumber or photon energy, with or without a unit. */
export function isWavelengthWord(label: string): boolean {
  const text = labelOf(label);
  return /wave\s?l(?:e?ngth|en)|wave\s?number|wellenl|wellenzahl|longueur d.onde|longitud de onda|comprimento de onda|lunghezza d.onda|golfl|lambda|\u03bb|(?:^|[^a-z])(?:wl|wvl|wlen|wave)(?![a-z])|photon energy/i.test(
    text,
  );
}

/** Whether a heading says that its column is x of a spectrum: by the word, or by the unit. */
export function namesX(label: string): boolean {
  return isWavelengthWord(label) || xUnitFromText(label) !== undefined;
}

/** Words over a column that is x of something else than a spectrum. */
export function otherAxisWord(label: string): 'time' | 'concentration' | 'temperature' | 'other' | undefined {
  const text = labelOf(label);
  if (xUnitFromText(text)) return undefined;
  if (
    /(?:^|[^a-z])(?:time|zeit|temps|tiempo|t\s*[([/]\s*(?:s|min|h)\s*[)\]]?|t_?(?:s|min)|seconds?|sec|minutes?|hours?|elapsed|cycle)(?![a-z])/i.test(
      text,
    )
  )
    return 'time';
  if (
    /(?:^|[^a-z])(?:conc(?:\.|entrations?)?|konz(?:entration)?|mg\s?\/\s?m?l|\u00b5g\s?\/\s?m?l|ug\s?\/\s?m?l|g\s?\/\s?l|mmol|ppm|ppb|mol\s?\/\s?l|[m\u00b5un]m)(?![a-z])/i.test(
      text,
    )
  )
    return 'concentration';
  if (/(?:^|[^a-z])(?:temp(?:erature|eratur)?|\u00b0c|kelvin)(?![a-z])/i.test(text)) return 'temperature';
  if (/(?:^|[^a-z])(?:volume|vol|mass|weight|ph|dose|depth|distance)(?![a-z])/i.test(text)) return 'other';
  return undefined;
}

export interface SignalWords {
  readonly signal: SignalKind;
  readonly scale: number;
  /** T without a per cent sign: fraction or percentage is decided by the values. */
  readonly openScale?: boolean;
}

const COEFFICIENT =
  /cross.?section|x-?sec|coefficient|koeffizient|epsilon|\u03b5|molar|absorptivity|1\s*\/\s*m(?![a-z])|(?<![a-z])m\^?-1|cm\^?2(?![a-z\d])|molecule|quantum|yield|emission|fluoresc|intensity|counts|variance|error|std|sd(?![a-z])|reflect|%\s*r(?![a-z])|derivative|refractive|kubelka/i;

/** What the ordinate is by its words, or undefined when they say nothing of it (a sample's name, say). */
export function signalFromText(text: string): SignalWords | undefined {
  const word = labelOf(text.trim().replace(/[_\u00a0]/g, ' '));
  if (word === '') return undefined;
  if (/(?:^|[^a-z])(?:mau|mabs|m\s?abs|milli-?absorbance(?: units?)?|mod)(?![a-z])/i.test(word))
    return { signal: 'absorbance', scale: 0.001 };
  if (COEFFICIENT.test(word)) return { signal: 'other', scale: 1 };
  if (
    /%\s*t(?![a-su-z])|(?:^|[^a-z])t\s*[([/,:]?\s*%|percent\s*t|(?:transm\w*|durchl\w*)[^a-z]*(?:%|percent|prozent)|%\s*(?:transm|durchl)|pct\s*t/i.test(
      word,
    )
  ) {
    return { signal: 'percentTransmittance', scale: 1 };
  }
  if (
    /transmi(?:tt?ance|ssion|tancia|tanz)|transmissie|durchl\u00e4ssigkeit/i.test(word) ||
    /^t$|(?:^|[\s:([])T(?:$|[\s)\]])/.test(word)
  ) {
    return { signal: 'transmittance', scale: 1, openScale: true };
  }
  if (/(?:^|[^a-z])[\u00b5\u03bcu]au(?![a-z])/i.test(word)) return { signal: 'absorbance', scale: 1e-6 };
  if (
    /absorb[aeiou]n[czt]|absorpt|extin[ck]t|(?:^|[^a-z])(?:abs|au|a\.u\.|od|o\.d\.|optical density)(?![a-z])|(?:^|[^a-z])(?:od|abs)\s?\d{3}/i.test(
      word,
    )
  ) {
    return { signal: 'absorbance', scale: 1 };
  }
  if (/^(?:a|e|ext\.?|a\s?[([].*)$/i.test(word) || /(?:^|[\s:])A$/.test(word))
    return { signal: 'absorbance', scale: 1 };
  return undefined;
}
