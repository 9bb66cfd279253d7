import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { SAMPLES, STANDARDS } from '../../../../fixtures/generate/demo-data';
import { demoFiles } from '../../../../fixtures/generate/write-demo';
import { readFile } from '@/lib/readers/read-file';
import type { ReadSpectrum } from '@/lib/readers/types';
import { sharedFile } from '../../../support/shared';

const files = demoFiles();
const read = (name: string): readonly ReadSpectrum[] =>
  readFile(new TextEncoder().encode(files[name] ?? ''), name).spectra;
const at510 = (spectrum: ReadSpectrum | undefined): number =>
  Number((spectrum?.y[spectrum.x.indexOf(510)] ?? NaN).toFixed(4));

test('the standards read at 510 nm are the calibration readings', () => {
  const wanted = STANDARDS.flatMap((standard) => [...standard.readings]);
  expect(read('LR-114-standards.csv').map(at510)).toEqual(wanted);
});

test.each(SAMPLES)('$id read at 510 nm gives its two readings', ({ id, readings }) => {
  expect(read(`${id}.dx`).map(at510)).toEqual([...readings]);
});

test('the readings are those of the demonstration batch', () => {
  const calibration = sharedFile('demo/calibration.csv');
  const run = sharedFile('demo/run.csv');
  if (!calibration || !run) return;
  const values = readFileSync(calibration, 'utf8')
    .trim()
    .split(/\r?\n/)
    .slice(1)
    .map((line) => Number(line.split(',')[2]));
  expect(STANDARDS.flatMap((standard) => [...standard.readings])).toEqual(values);
  const rows = readFileSync(run, 'utf8').split(/\r?\n/);
  for (const { id, readings } of SAMPLES)
    expect(rows.find((row) => row.split(',')[1] === id)).toContain(`,${readings[0]},${readings[1]},`);
});

test('the saturated sample can be estimated from its wing', () => {
  // domain: true value 48.6 mg/L in the sample, twice the final solution; the wing lies at 580 to 600 nm.
  const band = (nm: number, centre: number, width: number): number =>
    Math.exp(-4 * Math.log(2) * ((nm - centre) / width) ** 2);
  const shape = (nm: number): number => band(nm, 510, 78) + 0.62 * band(nm, 464, 70);
  const [scan] = read('S05.dx');
  for (const nm of [580, 590, 600]) {
    const net = (scan?.y[scan.x.indexOf(nm)] ?? NaN) - 0.0041;
    const estimate = (2 * net * shape(510)) / shape(nm) / (11100 / 55845);
    expect(Math.abs(estimate - 48.6)).toBeLessThan(1);
  }
});
