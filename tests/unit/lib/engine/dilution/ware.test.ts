import { describe, expect, test } from 'vitest';
import { volumeUncertainty, WARE, type WareItem, wareLibrary, wareOf } from '@/lib/engine';
import { expectDigits } from '../../../../support/digits';

const find = (id: string) => {
  const item = WARE.find((entry) => entry.id === id);
  if (!item) throw new Error(`no ${id}`);
  return item;
};

describe('the library of ware', () => {
  // Kealey and Haines, table 2.6 (ASTM style, class A); EURACHEM/CITAC CG 4 A1 for the flask of 100 mL (ISO 1042).
  test.each([
    ['ASTM E969 class A 1 mL', 0.006],
    ['ASTM E969 class A 5 mL', 0.01],
    ['ASTM E969 class A 10 mL', 0.02],
    ['ASTM E969 class A 25 mL', 0.03],
    ['ASTM E969 class A 50 mL', 0.05],
    ['ASTM E969 class A 100 mL', 0.08],
    ['ASTM E288 class A 25 mL', 0.03],
    ['ASTM E288 class A 50 mL', 0.05],
    ['ASTM E288 class A 100 mL', 0.08],
    ['ASTM E288 class A 250 mL', 0.12],
    ['ASTM E288 class A 1000 mL', 0.3],
    ['ASTM E288 class A 2000 mL', 0.5],
    ['ISO 1042 class A 100 mL', 0.1],
  ])('%s is ±%s mL, as published', (id, tolerance) => {
    expect(find(id)).toMatchObject({ toleranceMl: tolerance, basis: 'published', className: 'class A' });
  });

  // Typed from memory, and said so by the entry.
  test.each([
    ['ISO 648 class A 1 mL', 0.008],
    ['ISO 648 class A 50 mL', 0.05],
    ['ISO 1042 class A 1000 mL', 0.4],
    ['ASTM E969 class A 20 mL', 0.03],
    ['ASTM E288 class A 200 mL', 0.1],
  ])('%s is ±%s mL, from memory', (id, tolerance) => {
    expect(find(id)).toMatchObject({ toleranceMl: tolerance, basis: 'memory' });
  });

  // ISO 8655-2, 1000 µL, air displacement: 8 µL systematic, 3 µL random.
  test('knows the two errors of a piston pipette', () => {
    const item = find('ISO 8655-2 type A 1000 \u00b5L');
    expect(item).toMatchObject({ kind: 'piston pipette', basis: 'published', nominalMl: 1 });
    expectDigits(item.toleranceMl, 0.008, 14);
    expectDigits(item.repeatabilityMl ?? NaN, 0.003, 14);
    expect(find('ISO 8655-2 type A 200 \u00b5L').basis).toBe('memory');
    expectDigits(volumeUncertainty(1, wareOf(item)), Math.hypot(0.008 / Math.sqrt(6), 0.003), 13);
  });

  test('gives class B twice the tolerance of class A', () => {
    for (const b of WARE.filter((item) => item.className === 'class B'))
      expectDigits(b.toleranceMl, 2 * find(b.id.replace('class B', 'class A')).toleranceMl, 14);
  });

  test('has each entry once, with its standard and class', () => {
    expect(new Set(WARE.map((item) => item.id)).size).toBe(WARE.length);
    for (const item of WARE) expect(item.id.startsWith(`${item.standard} ${item.className}`)).toBe(true);
  });

  test('is edited by a list of the laboratory', () => {
    const own: WareItem[] = [
      { ...find('ISO 648 class A 5 mL'), toleranceMl: 0.007, basis: 'published' },
      { ...find('ISO 648 class A 5 mL'), id: 'our pipette of 7 mL', nominalMl: 7 },
    ];
    const edited = wareLibrary(own);
    expect(edited).toHaveLength(WARE.length + 1);
    expect(edited.find((item) => item.id === 'ISO 648 class A 5 mL')?.toleranceMl).toBe(0.007);
    expect(wareLibrary()).toEqual(WARE);
  });

  test('becomes what a budget asks for', () => {
    expect(wareOf(find('ISO 1042 class A 100 mL'), { piece: 'F1', temperatureRangeK: 4 })).toEqual({
      toleranceMl: 0.1,
      piece: 'F1',
      temperatureRangeK: 4,
    });
  });
});
