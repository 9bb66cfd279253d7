import { readFile } from '@/lib/readers/read-file';
import { type CheckRow, type CheckSource, sourceOf } from '../types';

const ORDINATES = [1, 2, 3, 3, 2, 1, 0, -1, -2, -3];

/** The same ten ordinates in each form; before them the first wavelength. */
const FORMS: readonly (readonly [string, string])[] = [
  ['fixed', '400 1 2 3 3 2 1 0 -1 -2 -3'],
  ['packed', '400 1+2+3+3+2+1+0-1-2-3'],
  ['squeezed', '400 1BCCBA@abc'],
  ['differences', '400 1JJ%jjjjjj'],
  ['differences with repeats', '400 1JT%jX'],
];

const HEAD = `##TITLE=Table VII
##JCAMP-DX=4.24
##DATA TYPE=UV/VIS SPECTRUM
##XUNITS=NANOMETERS
##YUNITS=ABSORBANCE
##FIRSTX=400
##LASTX=409
##NPOINTS=10
##XFACTOR=1
##YFACTOR=1
##XYDATA=(X++(Y..Y))`;

function ordinatesAsPrinted(line: string): number {
  const file = new TextEncoder().encode(`${HEAD}\n${line}\n##END=\n`);
  const [spectrum] = readFile(file, 'table-vii.jdx').spectra;
  const read = Array.from(spectrum?.y ?? []);
  return read.length === ORDINATES.length ? read.filter((y, i) => y === ORDINATES[i]).length : NaN;
}

/** The forms in which a spectrum file can hold one row of ordinates. */
export function jcamp(): CheckSource {
  return sourceOf({
    id: 'jcamp',
    title: 'Packed spectra',
    source: 'R. S. McDonald and P. A. Wilks, Appl. Spectrosc. 42 (1988) 151 (JCAMP-DX 4.24), Table VII',
    kind: 'seen in print',
    rows: FORMS.map(([form, line]): CheckRow => [
      `${form}: ordinates as printed, of 10`,
      '10',
      () => ordinatesAsPrinted(line),
    ]),
  });
}
