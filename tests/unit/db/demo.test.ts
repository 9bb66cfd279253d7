import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { actorForPerson } from '@/db/actors';
import { seedDemo } from '@/db/demo/seed';
import { listBatches, loadBatch } from '@/db/queries/batches';
import { listNotebooks } from '@/db/queries/notebooks';
import { listRecord } from '@/db/queries/record';
import { db } from '@/db/sequelize';
import type { BatchView } from '@/lib/views/batch';
import type { DeterminationView } from '@/lib/views/determination';
import { openTestDatabase, type TestDatabase } from '../../support/db';
import { expectDigits } from '../../support/digits';
import { sharedFile } from '../../support/shared';

interface GoldenUnknown {
  readonly measured: number;
  readonly uMeasured: number;
  readonly computed: number;
  readonly u: number;
  readonly U: number;
  readonly case: string;
}
interface Golden {
  readonly curves: Readonly<
    Record<string, { readonly k: number; readonly unknowns: Readonly<Record<string, GoldenUnknown>> }>
  >;
}

let database: TestDatabase;
let batch: BatchView;
let notebookId: string;

beforeAll(async () => {
  database = await openTestDatabase();
  await seedDemo();
  const pi = await db().Person.findOne({ where: { role: 'pi' } });
  const actor = await actorForPerson(pi?.id ?? '');
  notebookId = (await listNotebooks(actor))[0]?.id ?? '';
  const { items } = await listBatches(actor, notebookId, { limit: 10 });
  batch = await loadBatch(actor, items[0]?.id ?? '');
}, 120_000);
afterAll(() => database.close());

const result = (sample: string): DeterminationView['result'] => {
  const found = batch.determinations.find((determination) => determination.sample === sample);
  if (!found) throw new Error(`no sample ${sample} in the demo`);
  return found.result;
};

const REPORT_CASES: Readonly<Record<string, string>> = {
  value: 'value',
  'above the absorbance limit': 'notQuantified',
  'above the top standard': 'aboveTopStandard',
  'detected, below the lowest standard': 'belowLowestStandard',
  'below the critical value': 'belowCriticalValue',
};

describe('the demo batch LR-114', () => {
  test('agrees with numbers computed outside the project, sample by sample', () => {
    const file = sharedFile('demo/golden.json');
    if (!file) return;
    // Computed with numpy and scipy from the measurement model, independently of this project.
    const golden = (JSON.parse(readFileSync(file, 'utf8')) as Golden).curves.none;
    if (!golden) throw new Error('the golden file has no curve "none"');
    for (const { sample, result: own } of batch.determinations) {
      const expected = golden.unknowns[sample];
      if (!expected) throw new Error(`the golden file has no ${sample}`);
      expect(own.reportCase, sample).toBe(REPORT_CASES[expected.case]);
      if (own.measured) {
        expectDigits(own.measured.value, expected.measured, 9);
        expectDigits(own.measured.u, expected.uMeasured, 9);
      }
      if (own.concentration) {
        expectDigits(own.concentration.value, expected.computed, 9);
        expectDigits(own.concentration.u, expected.u, 9);
        expectDigits(own.concentration.U, expected.U, 9);
        expectDigits(own.concentration.k, golden.k, 9);
      }
    }
  });

  test('tells its stories: saturated, below the lowest standard, diluted, turbid', () => {
    expect(result('S05')).toMatchObject({ concentration: null, reportCase: 'notQuantified' });
    expect(result('S05').flags.map((flag) => flag.level)).toContain('stop');
    expect(result('S05').advice).toMatch(/1 in \d+/);
    // the scenario's own truth: 48.6 mg/L
    expect(Math.abs((result('S05-D10').concentration?.value ?? 0) - 48.6)).toBeLessThan(0.2);
    expect(result('S06').reportCase).toBe('belowLowestStandard');
    // 0.01 mg/L measured stands above the critical value of 0.009 for two readings, so it is told from a blank
    expect(result('S08').reportCase).toBe('belowLowestStandard');
    // uncorrected turbidity doubles it: the truth is 1.58 mg/L
    expect(result('S07').concentration?.value).toBeGreaterThan(3);
  });

  test('is in the record, entry by entry, in the name of the analyst', async () => {
    const pi = await db().Person.findOne({ where: { role: 'pi' } });
    const { items } = await listRecord(await actorForPerson(pi?.id ?? ''), notebookId, { limit: 100 });
    const kinds = new Set(items.map((entry) => entry.kind));
    expect([...kinds]).toEqual(
      expect.arrayContaining(['batch', 'determination', 'standard curve', 'source file']),
    );
    expect(
      items.filter((entry) => entry.kind === 'source file').every((entry) => entry.who === 'Tobin Farrow'),
    ).toBe(true);
  });
});
