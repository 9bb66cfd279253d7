import { recordMeanU } from '../direct/standard-reading';
import type { MeanReading } from '../direct/mean-reading';
import type { DirectMethod, DirectRead } from '../direct/method';
import type { UnknownRequest } from '../types';
import type { Expanded } from '../uncertainty/combine';
import type { ConvertedReadings } from '../unknown/convert-readings';
import type { Scaling } from '../unknown/scaling';
import type { Ledger } from './ledger';
import { recordBudget } from './record-budget';
import { recordBlanks } from './record-curve';
import { recordMean } from './record-mean';
import { recordReport } from './record-report';

export interface DirectRecord {
  readonly method: DirectMethod;
  readonly unknown: UnknownRequest;
  readonly readings: ConvertedReadings;
  readonly mean: MeanReading | null;
  readonly read: DirectRead | null;
  readonly scaling: Scaling;
  readonly budget: Expanded | null;
  readonly critical: number | null;
  readonly report: string;
}

/** The derivation of one result without a curve, from its readings to the text that is reported. */
export function recordDirect(ledger: Ledger, record: DirectRecord): void {
  const { method, unknown, readings, mean, read, scaling, budget } = record;
  const { unit, confidence } = method.request;
  recordMean(ledger, method.measuring, unknown, readings);
  if (mean && read && budget) {
    const ids = readings.used.map((i) => `unknown.reading.${i + 1}.reading`);
    recordMeanU(ledger, mean, { id: 'unknown.u.mean', of: 'the unknown', inputs: ids, p: 'unknown.p' });
    ledger.line(
      {
        id: 'unknown.measured',
        label: 'Concentration in the measured solution',
        symbol: 'c',
        unit,
        source: read.source,
      },
      read.expression,
      { ...read.from, y0: 'unknown.mean' },
      read.c,
    );
    recordBudget(ledger, { unit, confidence, scaling, budget, nuFrom: [] });
  }
  const critical = recordCriticalValue(ledger, record);
  recordReport(ledger, unknown, budget !== null, critical, record.report);
}

function recordCriticalValue(ledger: Ledger, { method, critical }: DirectRecord): readonly string[] {
  if (critical === null) return [];
  ledger.solved(
    {
      id: 'unknown.critical',
      label: 'Critical value, in the measured solution',
      symbol: 'x_C',
      unit: method.request.unit,
      source: 'ISO 11843-1, with the scatter of the blank',
    },
    't(0.95; nu) * s * sqrt(1 / K + 1 / p_b), as a concentration',
    [],
    critical,
  );
  return ['unknown.critical'];
}

/** Lines that all results of a method rest on: its blanks, and its own. */
export function recordMethod(ledger: Ledger, method: DirectMethod): void {
  recordBlanks(ledger, method.measuring);
  method.record(ledger);
}
