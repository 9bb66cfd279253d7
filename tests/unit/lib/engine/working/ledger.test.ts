import { describe, expect, test } from 'vitest';
import { calculateStandardCurve } from '@/lib/engine';
import { Ledger } from '@/lib/engine/working/ledger';
import { request } from '../requests';

const line = (id: string) => ({ id, label: id, symbol: id, source: 'test' });

describe('the ledger', () => {
  test('writes its lines when somebody first asks, and once', () => {
    let written = 0;
    const above = new Ledger(undefined, (lines) => {
      written += 1;
      lines.given(line('x'), 2);
    });
    const below = new Ledger(above, (lines) => lines.line(line('y'), 'x * x', { x: 'x' }, 4));
    expect(written).toBe(0);
    expect(below.steps.map((step) => step.substituted)).toEqual(['y = 2 * 2']);
    expect(above.steps).toHaveLength(1);
    expect(below.present(['x', 'y', 'z'])).toEqual(['x', 'y']);
    expect(written).toBe(1);
  });

  test('writes long sums by their ends and divides by what it is told', () => {
    const ledger = new Ledger();
    const ids = Array.from({ length: 41 }, (_, i) => `a${i}`);
    ids.forEach((id, i) => ledger.given(line(id), i));
    ledger.given(line('n'), 41);
    const terms = ids.map((a) => ({ a }));
    ledger.sum(line('m'), 'a', terms, 20, { n: 'n' });
    ledger.sum(line('s'), 'a', terms.slice(0, 40), 780);
    const [mean, sum] = ledger.steps.slice(-2);
    expect(mean).toMatchObject({
      formula: 'm = sum(a) / n',
      substituted: 'm = (0 + 1 + ... 38 more terms ... + 40) / 41',
    });
    expect(mean?.inputs).toHaveLength(42);
    expect(sum?.substituted.split(' + ')).toHaveLength(40);
  });

  test('says so when a line is made from one that is not there', () => {
    expect(() => new Ledger().line(line('y'), 'x', { x: 'x' }, 1)).toThrow('the working has no line x');
  });
});

test('an answer carries its working through JSON and through copies', () => {
  const { curve } = calculateStandardCurve(request());
  const copy = structuredClone(curve);
  expect(copy.working.length).toBeGreaterThan(20);
  expect(JSON.parse(JSON.stringify(curve))).toMatchObject({ working: copy.working });
});
