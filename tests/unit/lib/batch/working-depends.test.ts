import { expect, test } from 'vitest';
import { requestWith, type UnknownSample } from '@/lib/batch/unknown-request';
import { calculateStandardCurve, type CurveRequest, type WorkingStep } from '@/lib/engine';
import { EXAMPLE_CURVE, typedSample } from '../../../support/example-batch';

const SAMPLE: UnknownSample = {
  ...typedSample('Weir 3', [0.4021, 0.4013]),
  dilution: [{ takenMl: 10, toMl: 100 }],
};

function workingOf(sample: UnknownSample, curve: CurveRequest = EXAMPLE_CURVE): Map<string, WorkingStep> {
  const answer = calculateStandardCurve(requestWith(curve, [sample]));
  const steps = [...answer.curve.working, ...(answer.unknowns[0]?.working ?? [])];
  return new Map(steps.map((step) => [step.id, step]));
}

/** Every line that is made from `changed`, directly or through others. */
function dependents(steps: ReadonlyMap<string, WorkingStep>, changed: string): Set<string> {
  const found = new Set([changed]);
  for (let before = 0; before !== found.size;) {
    before = found.size;
    for (const step of steps.values()) if (step.inputs.some((id) => found.has(id))) found.add(step.id);
  }
  found.delete(changed);
  return found;
}

/** Lines that hold a whole number or a choice and may rightly stay while their inputs move. */
const MAY_STAY = new Set(['unknown.nu', 'unknown.k']);

interface Altered {
  readonly line: string;
  readonly sample?: UnknownSample;
  readonly curve?: CurveRequest;
}

const reading = { value: 0.4121, gapText: null, signal: 'absorbance' } as const;
const standards = EXAMPLE_CURVE.standards.map((one, index) =>
  index === 3 ? { ...one, readings: [0.4089, 0.4006] } : one,
);

test.each<[string, Altered]>([
  [
    'the first reading',
    {
      line: 'unknown.reading.1.reading',
      sample: { ...SAMPLE, readings: [reading, ...SAMPLE.readings.slice(1)] },
    },
  ],
  [
    'the volume taken',
    { line: 'unknown.dilution.1.taken', sample: { ...SAMPLE, dilution: [{ takenMl: 20, toMl: 100 }] } },
  ],
  [
    'the volume made up to',
    { line: 'unknown.dilution.1.to', sample: { ...SAMPLE, dilution: [{ takenMl: 10, toMl: 250 }] } },
  ],
  ['the slope, through a standard', { line: 'curve.slope', curve: { ...EXAMPLE_CURVE, standards } }],
])(
  'altering %s alters every line of the working that is made from it',
  (_what, { line, sample = SAMPLE, curve }) => {
    const [before, after] = [workingOf(SAMPLE), workingOf(sample, curve)];
    expect(after.get(line)?.value).not.toEqual(before.get(line)?.value);
    const ids = [...dependents(before, line)];
    expect(ids).toContain('unknown.report');
    expect(ids).toContain('unknown.U');
    const stayed = ids.filter(
      (id) =>
        !MAY_STAY.has(id) &&
        before.get(id)?.value === after.get(id)?.value &&
        before.get(id)?.substituted === after.get(id)?.substituted,
    );
    expect(stayed).toEqual([]);
  },
);

test('the numbers in a line are those of the lines it was made from', () => {
  const steps = workingOf(SAMPLE);
  expect(steps.get('unknown.mean')?.substituted).toBe('y0 = (0.4021 + 0.4013) / 2');
  expect(steps.get('unknown.factor')?.substituted).toBe('F = 100 / 10');
});
