import { evaluate } from 'mathjs';
import { describe, expect, test } from 'vitest';
import { calculateStandardCurve, type CurveRequest, type Reading, type WorkingStep } from '@/lib/engine';
import { request, unknown } from '../requests';
import { expectOrdered } from './expect-ordered';

const BLANK = {
  readings: [0.991, 0.988],
  use: 'subtract' as const,
  otherPaths: [{ pathLengthMm: 20, readings: [0.979, 0.981] }],
};

const CONFIGURATIONS: Readonly<Record<string, CurveRequest>> = {
  'a plain line': request({ formulaMass: 55.845, unknowns: [unknown([0.351, 0.3523])] }),
  'transmittance, blank, other path, dilution': request({
    signal: 'transmittance',
    blank: BLANK,
    standards: [
      { concentration: 1, readings: [0.79, 0.788] },
      { concentration: 2, readings: [0.63, 0.628] },
      { concentration: 4, readings: [0.397, 0.399] },
      { concentration: 8, readings: [0.158, 0.157] },
    ],
    standardsRelativeU: 0.004,
    pathLengthUMm: 0.02,
    unknowns: [
      unknown([0.25, 0.2505], {
        pathLengthMm: 20,
        pathLengthUMm: 0.05,
        dilution: [{ takenMl: 5, toMl: 50, takenUMl: 0.01, toUMl: 0.04 }],
      }),
    ],
  }),
  'dilution by mass, recovery, named uncertainties, one pipette twice': request({
    recovery: { value: 0.93, u: 0.011 },
    standardsShared: [{ source: 'purity', relativeU: 0.0015 }],
    unknowns: [
      unknown([0.351, 0.3523], {
        dilution: [
          { takenG: 2.0013, toG: 19.987, takenUG: 0.0003, toUG: 0.0004 },
          { takenMl: 5, toMl: 50, takenWare: { toleranceMl: 0.015, piece: 'P5' }, toUMl: 0.03 },
          { takenMl: 5, toMl: 25, takenWare: { toleranceMl: 0.015, piece: 'P5' } },
        ],
      }),
    ],
  }),
  'weights 1/x': request({ weighting: '1/x', unknowns: [unknown([0.351, 0.3523])] }),
  'a line through zero': request({ model: 'proportional', unknowns: [unknown([0.351, 0.3523])] }),
  'a line through zero with its blank': request({
    model: 'proportional',
    blank: { readings: [0.003, 0.0045], use: 'subtract' },
    unknowns: [unknown([0.351, 0.3523])],
  }),
  'a variance function': request({
    weighting: 'varianceFunction',
    varianceFunction: { s0: 0.0008, k: 0.002 },
    unknowns: [unknown([0.351, 0.3523])],
  }),
  'replicates apart': request({ unknowns: [unknown([0.351, 0.371])] }),
};

function workingOf(asked: CurveRequest): readonly WorkingStep[] {
  const { curve, unknowns } = calculateStandardCurve(asked);
  return [...curve.working, ...(unknowns[0]?.working ?? [])];
}

/** Ids of every line made from the given one, directly or through others. */
function dependents(steps: readonly WorkingStep[], id: string): Set<string> {
  const found = new Set([id]);
  // Lines are recorded after what they are made from, so one pass is enough.
  for (const step of steps) if (step.inputs.some((input) => found.has(input))) found.add(step.id);
  return found;
}

const content = (step: WorkingStep) => `${step.substituted} | ${step.value}`;

describe.each(Object.entries(CONFIGURATIONS))('the working of %s', (_name, asked) => {
  const steps = workingOf(asked);

  test('names only lines that stand before, each once', () => {
    expectOrdered(steps);
    expect(steps.length).toBeGreaterThan(40);
  });

  // The substituted right-hand side, worked out by mathjs, is the value of the line: the text cannot drift from it.
  test.each(
    steps
      .filter((step) => step.formula.startsWith(`${step.symbol} = `))
      .map((step) => [step.id, step] as const),
  )('%s works out', (_id, step) => {
    const right = step.substituted.slice(step.symbol.length + 3);
    const worked = Number(evaluate(right));
    const value = Number(step.value);
    // Seven digits are shown; differences of close numbers lose some of them.
    expect(Math.abs(worked - value)).toBeLessThanOrEqual(2e-3 * Math.abs(value) + 1e-12);
  });
});

type Change = (asked: CurveRequest) => CurveRequest;
const firstStandard = (asked: CurveRequest, changes: object): CurveRequest => ({
  ...asked,
  standards: asked.standards.map((standard, i) => (i === 1 ? { ...standard, ...changes } : standard)),
});
const firstUnknown = (asked: CurveRequest, changes: object): CurveRequest => ({
  ...asked,
  unknowns: asked.unknowns.map((item) => ({ ...item, ...changes })),
});
const bump = (readings: readonly Reading[]) => [Number(readings[0]) * 1.001, ...readings.slice(1)];

/** What is altered, and the line that holds it. */
const CHANGES: readonly [string, string, Change][] = [
  [
    'a reading of the unknown',
    'unknown.reading.1.reading',
    (asked) => firstUnknown(asked, { readings: bump(asked.unknowns[0]?.readings ?? []) }),
  ],
  [
    'a reading of a standard',
    'curve.standard.2.1.reading',
    (asked) => firstStandard(asked, { readings: bump(asked.standards[1]?.readings ?? []) }),
  ],
  [
    'the concentration of a standard',
    'curve.standard.2.concentration',
    (asked) => firstStandard(asked, { concentration: (asked.standards[1]?.concentration ?? 0) * 1.01 }),
  ],
];

/** Lines whose value is a choice or a text that a small change need not turn. */
const MAY_STAY = new Set(['unknown.report']);

describe.each(Object.entries(CONFIGURATIONS))('altering an input of %s', (_name, asked) => {
  test.each(CHANGES)('%s changes every line made from it, and no other', (_what, id, change) => {
    const before = workingOf(asked);
    const after = new Map(workingOf(change(asked)).map((step) => [step.id, content(step)]));
    const made = dependents(before, id);
    const changed = before.filter((step) => after.get(step.id) !== content(step)).map((step) => step.id);
    const unmoved = [...made].filter((line) => !changed.includes(line) && !MAY_STAY.has(line));
    expect(unmoved).toEqual([]);
    expect(changed.filter((line) => !made.has(line))).toEqual([]);
  });
});

describe('altering an input of a diluted result', () => {
  const asked = CONFIGURATIONS['transmittance, blank, other path, dilution'] as CurveRequest;
  test.each<[string, string, Change]>([
    [
      'a blank',
      'curve.blankReading.10.1.reading',
      (a) => ({ ...a, blank: { ...BLANK, readings: [0.98, 0.988] } }),
    ],
    [
      'the path of the unknown',
      'unknown.path',
      (a) => ({
        ...firstUnknown(a, { pathLengthMm: 25 }),
        blank: { ...BLANK, otherPaths: [{ pathLengthMm: 25, readings: [0.979, 0.981] }] },
      }),
    ],
    [
      'the volume taken',
      'unknown.dilution.1.taken',
      (a) => firstUnknown(a, { dilution: [{ takenMl: 4.9, toMl: 50, takenUMl: 0.01, toUMl: 0.04 }] }),
    ],
  ])('%s', (_what, id, change) => {
    const before = workingOf(asked);
    const after = new Map(workingOf(change(asked)).map((step) => [step.id, content(step)]));
    for (const line of dependents(before, id)) {
      const step = before.find((item) => item.id === line) as WorkingStep;
      expect(after.get(line), line).not.toBe(content(step));
    }
  });

  test('the report changes with the reading', () => {
    const [was] = calculateStandardCurve(asked).unknowns;
    const [is] = calculateStandardCurve(firstUnknown(asked, { readings: [0.3, 0.3005] })).unknowns;
    expect(is?.report).not.toBe(was?.report);
    expect(is?.working.at(-1)?.value).toBe(is?.report);
  });
});
