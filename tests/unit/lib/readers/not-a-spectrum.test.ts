import { describe, expect, test } from 'vitest';
import { readFile } from '@/lib/readers/read-file';
import type { NotASpectrum } from '@/lib/readers/types';

const read = (text: string) => readFile(new TextEncoder().encode(text), 'table.csv');

const WELLS = Array.from({ length: 12 }, (_, i) => i + 1);
const plate = 'ABCDEFGH'
  .split('')
  .map((row, k) => `${row},${WELLS.map((well) => (0.05 * k + well / 100).toFixed(3)).join(',')}`);

/** Tables that laboratories keep beside their spectra, written by hand for this test. */
const TABLES: readonly (readonly [string, NotASpectrum['kind'], RegExp, string])[] = [
  ['seconds', 'kinetics', /over time/, 'Time (s),A340\n0,1.2\n5,1.19\n10,1.18\n15,1.17\n'],
  ['minutes, decimal comma', 'kinetics', /over time/, 't / min;A (412 nm)\n0;0,1\n0,5;0,2\n1;0,3\n1,5;0,4\n'],
  ['a plate with column numbers', 'plate', /plate/, `,${WELLS.join(',')}\n${plate.join('\n')}\n`],
  ['a plate without', 'plate', /plate/, `${plate.join('\n')}\n`],
  [
    'standards',
    'calibration',
    /standard curve/,
    'Standard,Conc (mg/L),A510\nS1,0.5,0.10\nS2,1,0.20\nS3,2,0.40\n',
  ],
  [
    'concentration as x',
    'calibration',
    /standard curve/,
    'c (mmol/L)\tAbs\n0.1\t0.05\n0.2\t0.1\n0.4\t0.21\n',
  ],
  [
    'readings of samples',
    'readings',
    /samples/,
    'Sample,A reading 1,A reading 2\nS01,0.09,0.09\nS02,0.34,0.33\n',
  ],
  ['one point', 'readings', /one or two wavelengths/, 'Wavelength (nm),Abs\n510,0.412\n'],
  ['two points', 'readings', /one or two wavelengths/, 'Wavelength (nm),Abs\n510,0.412\n700,0.003\n'],
  [
    'temperatures',
    'table',
    /without a wavelength/,
    'temperature/C,solubility (g)\n0,35.2\n10,35.6\n20,36.1\n',
  ],
];

describe('a table that is no spectrum is offered as what it is', () => {
  test.each(TABLES)('%s: %s', (_, kind, sentence, text) => {
    const { notASpectrum, spectra, dialect, preview } = read(text);
    expect(notASpectrum?.kind).toBe(kind);
    expect(notASpectrum?.message).toMatch(sentence);
    expect(notASpectrum?.message).toMatch(/\.$/);
    // One or two points may still be kept as a spectrum; the others are none.
    expect(spectra.length).toBe(/nm/.test(text) && kind === 'readings' ? 1 : 0);
    expect(dialect).not.toMatch(/1 points|0 spectra/);
    expect(preview.rows).toBe(notASpectrum?.rows.length);
    expect(preview.first[0]).toEqual(notASpectrum?.rows[0]);
  });

  test('its cells stay as they stand', () => {
    const { notASpectrum } = read('Standard;Conc (mg/L);A510\nS1;0,5;0,1031\nS2;1,0;OVER\nS3;2,0;0,4022\n');
    expect(notASpectrum?.columns).toEqual(['Standard', 'Conc (mg/L)', 'A510']);
    expect(notASpectrum?.rows[1]).toEqual(['S2', '1,0', 'OVER']);
  });
});
