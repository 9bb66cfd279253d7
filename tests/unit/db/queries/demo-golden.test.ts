import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createBatch, loadBatch } from '@/db/queries/batches';
import { addTypedSamples } from '@/db/queries/determinations';
import type { ReportCase } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import { addTypedSamples as addSchema } from '@/lib/schemas/determination';
import { openTestDatabase, type TestDatabase } from '../../../support/db';
import { expectDigits } from '../../../support/digits';
import { makeCurve, type StandardTexts } from '../../../support/example-curve';
import { actorOf, makeNotebook, makePerson } from '../../../support/factories';
import { sharedFile } from '../../../support/shared';

/*
 * The demo batch through forms' schemas, queries, database and engine against demo/golden.json, which was
 * computed from the measurement model by numpy and scipy, independently of this project.
 */

interface Golden {
  readonly computed: number;
  readonly u: number;
  readonly U: number;
  readonly measured: number;
  readonly uMeasured: number;
  readonly dilutionFactor: number;
  readonly case: string;
}

const CASES: Readonly<Record<string, ReportCase>> = {
  value: 'value',
  'above the absorbance limit': 'notQuantified',
  'above the top standard': 'aboveTopStandard',
  'detected, below the lowest standard': 'belowLowestStandard',
  'below the critical value': 'belowCriticalValue',
};

const lines = (file: string) =>
  readFileSync(file, 'utf8')
    .trim()
    .split('\n')
    .slice(1)
    .map((line) => (line.match(/("[^"]*"|[^,]*)(,|$)/g) ?? []).map((cell) => cell.replace(/,$/, '')));

function standards(file: string): StandardTexts {
  const byLevel = new Map<string, string[]>();
  for (const [level = '', , reading = ''] of lines(file))
    byLevel.set(level, [...(byLevel.get(level) ?? []), reading]);
  return [...byLevel].map(([level, readings]) => [level, ...readings] as const);
}

/** 25 mL of sample are made up to 50 mL with the reagents; some were diluted before that. */
function dilutionText(prepared: string, before: string): string {
  const steps = [Number(before) > 1 ? `1 in ${Number(before)}` : '', Number(prepared) > 1 ? '25 in 50' : ''];
  return steps.filter(Boolean).join('; ');
}

let database: TestDatabase;
let actor: Actor;
beforeAll(async () => {
  database = await openTestDatabase();
  actor = await actorOf((await makePerson('pi')).id);
});
afterAll(() => database.close());

test('every position of the demo run, unweighted curve', async () => {
  const [golden, calibration, run] = [
    sharedFile('demo/golden.json'),
    sharedFile('demo/calibration.csv'),
    sharedFile('demo/run.csv'),
  ];
  if (!golden || !calibration || !run) return;
  const notebookId = await makeNotebook(actor.personId ?? '');
  const curveId = await makeCurve(actor, notebookId, { standards: standards(calibration) });
  const { id } = await createBatch(actor, {
    notebookId,
    curveId,
    submissionKey: randomUUID(),
    title: 'Run',
    note: '',
  });
  const samples = lines(run).map(
    ([, sample = '', , , a1 = '', a2 = '', , , , , prepared = '', before = '']) => ({
      sample,
      readings: [a1, a2],
      pathLengthMm: '10',
      dilution: dilutionText(prepared, before),
    }),
  );
  const form = { batchId: id, submissionKey: randomUUID(), samples: JSON.stringify(samples) };
  await addTypedSamples(actor, addSchema.parse(form));
  const expected = (
    JSON.parse(readFileSync(golden, 'utf8')) as {
      curves: { none: { unknowns: Record<string, Golden>; k: number } };
    }
  ).curves.none;
  const { determinations } = await loadBatch(actor, id);
  expect(determinations).toHaveLength(Object.keys(expected.unknowns).length);
  for (const { sample, result } of determinations) {
    const it = expected.unknowns[sample];
    if (!it) throw new Error(`${sample} is not among the golden numbers`);
    expect([sample, result.reportCase]).toEqual([sample, CASES[it.case]]);
    expectDigits(result.computed ?? NaN, it.computed, 9);
    expectDigits(result.measured?.value ?? NaN, it.measured, 9);
    expectDigits(result.measured?.u ?? NaN, it.uMeasured, 9);
    expectDigits(result.dilutionFactor.value, it.dilutionFactor, 14);
    const quantified = result.reportCase === 'value' || result.reportCase === 'belowLowestStandard';
    expect(result.concentration !== null).toBe(quantified);
    if (!result.concentration) continue;
    expectDigits(result.concentration.u, it.u, 9);
    expectDigits(result.concentration.U, it.U, 9);
    expectDigits(result.concentration.k, expected.k, 9);
  }
});
