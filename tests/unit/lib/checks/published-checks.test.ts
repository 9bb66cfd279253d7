import { describe, expect, test, vi } from 'vitest';
import * as lines from '@/lib/checks/datasets/lines';
import * as strd from '@/lib/checks/datasets/nist-strd';
import { agreement, agrees, printedDigits } from '@/lib/checks/digits';
import { publishedChecks } from '@/lib/checks/published-checks';
import { runSource, tally, verdictOf } from '@/lib/checks/run-checks';
import { reference } from '../engine/requests';

const sources = publishedChecks();
const checks = sources.flatMap((source) => source.checks);

describe('the list', () => {
  test('has its sources, and every check an identity of its own', () => {
    expect(sources.length).toBeGreaterThan(15);
    expect(new Set(checks.map(({ id }) => id)).size).toBe(checks.length);
    expect(new Set(sources.map(({ id }) => id)).size).toBe(sources.length);
  });

  test('says of each value how it came here, with the identities apart', () => {
    expect(new Set(checks.map(({ kind }) => kind))).toEqual(
      new Set(['seen in print', 'typed from memory', 'identity']),
    );
  });
});

// The published values themselves are the reference; each source is named in the list.
describe.each(sources)('$title ($source)', (source) => {
  test.each(source.checks)('$what: $published', (check) => {
    const ours = check.compute();
    const found = agreement(ours, check.published);
    expect(agrees(found), `${ours} agrees with ${check.published} to ${found.digits} digits`).toBe(true);
    // Only where more digits are printed than a fit can keep may fewer than all agree.
    if (printedDigits(check.published) < 15) expect(found.all).toBe(true);
  });
});

describe('the data are those of fixtures/reference', () => {
  interface Line {
    x: number[];
    y: number[];
  }

  test('NIST StRD', () => {
    const printed = reference<Record<string, Line & { certified: Record<string, string> }>>('nist-strd');
    const ours = { Norris: strd.NORRIS, Pontius: strd.PONTIUS, NoInt1: strd.NOINT1, NoInt2: strd.NOINT2 };
    for (const [name, { x, y, certified }] of Object.entries(ours)) {
      expect({ x, y }).toEqual({ x: printed[name]?.x, y: printed[name]?.y });
      const { residual_sd: residualSd, R2: rSquared, ...rest } = printed[name]?.certified ?? {};
      expect({ ...rest, residualSd, rSquared }).toMatchObject(certified);
    }
  });

  test('the lines', () => {
    const { A5 } = reference<{ A5: { c: number[]; A: number[]; sample_A: number[] } }>('eurachem-cg4');
    expect(lines.CADMIUM).toEqual({ x: A5.c, y: A5.A, sample: A5.sample_A });
    const miller = reference<{ fluorescein: Line; weighted: Line & { s: number[] } }>('miller-miller');
    expect(miller.fluorescein).toMatchObject(lines.FLUORESCEIN);
    expect(miller.weighted).toMatchObject(lines.WEIGHTED);
    expect(reference<Line>('graybill-iyer')).toMatchObject(lines.THERMOMETER);
  });
});

describe('running', () => {
  const [first] = sources;
  if (!first) throw new Error('no source');
  const [check] = first.checks;
  if (!check) throw new Error('no check');

  test('gives each check of a source its number', () => {
    expect(Object.keys(runSource(first))).toEqual(first.checks.map(({ id }) => id));
  });

  test('a check that throws or has no number is null, and the others keep theirs', () => {
    const broken = {
      ...first,
      checks: [
        { ...check, id: 'a', compute: vi.fn(() => NaN) },
        {
          ...check,
          id: 'b',
          compute: () => {
            throw new Error('refused');
          },
        },
        { ...check, id: 'c', compute: () => 4 },
      ],
    };
    expect(runSource(broken)).toEqual({ a: null, b: null, c: 4 });
  });

  test('a number agrees, disagrees, or is waited for', () => {
    expect(verdictOf(check, { [check.id]: Number(check.published) })).toBe('agrees');
    expect(verdictOf(check, { [check.id]: Number(check.published) * 1.01 })).toBe('disagrees');
    expect(verdictOf(check, { [check.id]: null })).toBe('disagrees');
    expect(verdictOf(check, {})).toBe('waiting');
    expect(tally([first], { [check.id]: null })).toEqual({
      agree: 0,
      disagree: 1,
      waiting: first.checks.length - 1,
      total: first.checks.length,
    });
  });

  test('a curve is calculated anew in every run', () => {
    const [again] = publishedChecks();
    expect(again?.checks[0]?.compute).not.toBe(check.compute);
  });
});
