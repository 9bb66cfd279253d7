import { expect, test } from 'vitest';
import { resultsCsv, resultsFileName } from '@/lib/batch/results-csv';
import { resultsText } from '@/lib/batch/results-text';
import { exampleBatch, typedSample } from '../../../support/example-batch';

/** A reader of RFC 4180 of its own, so that the writer is not checked by itself. */
function readCsv(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let field = '';
  let quoted = false;
  for (let i = 0; i < text.length; i += 1) {
    const char = text[i];
    if (quoted && char === '"' && text[i + 1] === '"') [field, i] = [`${field}"`, i + 1];
    else if (char === '"') quoted = !quoted;
    else if (char === ',' && !quoted) [row, field] = [[...row, field], ''];
    else if (char === '\r' && text[i + 1] === '\n' && !quoted) {
      rows.push([...row, field]);
      [row, field, i] = [[], '', i + 1];
    } else field += char;
  }
  expect(field).toBe('');
  return rows;
}

function table(text: string): Record<string, string>[] {
  const [head = [], ...rows] = readCsv(text);
  return rows.map((row) => Object.fromEntries(head.map((name, index) => [name, row[index] ?? ''])));
}

test('one line a sample, with value, unit, basis, u, U, k and where it came from', () => {
  const batch = exampleBatch([typedSample('Weir 3', [0.4021, 0.4013])]);
  const [row] = table(resultsCsv(batch));
  const concentration = batch.determinations[0]?.result.concentration;
  expect(row).toMatchObject({
    sample: 'Weir 3',
    unit: 'mg/L',
    basis: 'Fe',
    coverage: '0.95',
    'degrees of freedom': '8',
    'dilution factor': '1',
    'path length (mm)': '10',
    flags: '',
    curve: 'Iron, 510 nm',
    'curve version': '2',
    engine: batch.determinations[0]?.engineVersion,
    batch: 'Weir samples',
  });
  expect(Number(row?.['value (mg/L)'])).toBe(concentration?.value);
  expect(Number(row?.['U (mg/L)'])).toBe(concentration?.U);
  expect(Number(row?.['mean absorbance as read'])).toBeCloseTo(0.4017, 10);
  expect(Number(row?.['interval low (mg/L)'])).toBe(
    (concentration?.value ?? NaN) - (concentration?.U ?? NaN),
  );
});

test('a saturated sample leaves without a number in any column of the result', () => {
  const [row] = table(resultsCsv(exampleBatch([typedSample('Drain', [2.413, 2.3987])])));
  for (const column of [
    'value (mg/L)',
    'u (mg/L)',
    'U (mg/L)',
    'k',
    'interval low (mg/L)',
    'interval high (mg/L)',
  ])
    expect(row?.[column]).toBe('');
  expect(row?.report).toMatch(/^not quantified: dilute /);
  expect(row?.flags).toContain('READING_OVER_LIMIT');
});

test('void determinations stay at home', () => {
  const batch = exampleBatch([typedSample('kept', [0.4]), typedSample('void', [0.5])]);
  const [first, second] = batch.determinations;
  if (!first || !second) throw new Error('two determinations were made');
  const csv = resultsCsv({
    ...batch,
    determinations: [first, { ...second, voidedAt: '2026-12-01T10:00:00Z' }],
  });
  expect(table(csv).map((row) => row.sample)).toEqual(['kept']);
});

test.each(['=1+1', '+SUM(A1)', '-2', '@cmd'])('a text that starts a formula is guarded: %s', (sample) => {
  const [row] = table(resultsCsv(exampleBatch([typedSample(sample, [0.4])])));
  expect(row?.sample).toBe(`'${sample}`);
});

test('a negative number is a number and is not guarded', () => {
  const [row] = table(resultsCsv(exampleBatch([typedSample('blank-like', [-0.002])])));
  expect(row?.['mean absorbance as read']).toBe('-0.002');
});

test('commas, quotes and line ends of a text survive', () => {
  const sample = 'Weir "3", upper\r\nleft';
  const [row] = table(resultsCsv(exampleBatch([typedSample(sample, [0.4])])));
  expect(row?.sample).toBe(sample);
});

test('lines end in CR LF, the last one too', () => {
  const csv = resultsCsv(exampleBatch([typedSample('a', [0.4])]));
  expect(csv.endsWith('\r\n')).toBe(true);
  expect(csv.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
});

test('the file is named after the batch and its version', () => {
  expect(resultsFileName(exampleBatch([], 'Tessel, July: weirs/1'))).toBe(
    'Tessel-July-weirs-1-v1-results.csv',
  );
  expect(resultsFileName(exampleBatch([], '///'))).toBe('batch-v1-results.csv');
});

test('the copied table has a row of units and the decimal mark asked for', () => {
  const batch = exampleBatch([typedSample('Weir\t3', [0.4021])]);
  const lines = resultsText(batch, 'comma')
    .split('\n')
    .map((line) => line.split('\t'));
  const [names = [], units = [], row = []] = lines;
  expect(units[names.indexOf('value')]).toBe('mg/L');
  expect(units[names.indexOf('path length')]).toBe('mm');
  expect(row[names.indexOf('sample')]).toBe('Weir 3');
  expect(row[names.indexOf('mean absorbance as read')]).toBe('0,4021');
  expect(resultsText(batch, 'point')).toContain('\t0.4021\t');
  expect(new Set(lines.map((line) => line.length)).size).toBe(1);
});
