/** A small JCAMP-DX spectrum with invented numbers: `absorbance` by whole nanometres from `firstNm`. */
export function jcampText(title: string, firstNm: number, absorbance: readonly (number | string)[]): string {
  const lastNm = firstNm + absorbance.length - 1;
  const head = [
    `##TITLE=${title}`,
    '##JCAMP-DX=4.24',
    '##DATA TYPE=UV/VIS SPECTRUM',
    '##ORIGIN=invented for a test',
    '##OWNER=nobody',
    '##XUNITS=NANOMETERS',
    '##YUNITS=ABSORBANCE',
    '##PATHLENGTH=1.0',
    `##FIRSTX=${firstNm}`,
    `##LASTX=${lastNm}`,
    `##NPOINTS=${absorbance.length}`,
    '##XFACTOR=1',
    '##YFACTOR=1',
    '##XYPOINTS=(XY..XY)',
  ];
  const points = absorbance.map((value, i) => `${firstNm + i}, ${value}`);
  return [...head, ...points, '##END=', ''].join('\n');
}

/** The same as an upload of the queries. */
export function jcampUpload(name: string, firstNm: number, absorbance: readonly (number | string)[]) {
  return { name: `${name}.jdx`, bytes: new TextEncoder().encode(jcampText(name, firstNm, absorbance)) };
}
