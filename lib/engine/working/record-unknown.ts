import type { CriticalValue } from '../calibration/critical-value';
import type { FittedCurve } from '../fit-curve';
import type { UnknownRequest } from '../types';
import type { Expanded } from '../uncertainty/combine';
import type { ConvertedReadings } from '../unknown/convert-readings';
import type { ReadBack } from '../unknown/read-back';
import type { Scaling } from '../unknown/scaling';
import type { Ledger } from './ledger';
import { recordBudget } from './record-budget';
import { recordReport } from './record-report';
import { recordReadBack } from './record-read-back';
import { recordCritical } from './record-critical';
import { recordMean } from './record-mean';

/** Everything the calculation of one unknown made, for its working. */
export interface UnknownRecord {
  readonly curve: FittedCurve;
  readonly unknown: UnknownRequest;
  readonly readings: ConvertedReadings;
  readonly back: ReadBack | null;
  readonly scaling: Scaling;
  readonly budget: Expanded | null;
  readonly critical: CriticalValue;
  readonly report: string;
}

/** The derivation of one result, from its readings to the text that is reported. */
export function recordUnknown(ledger: Ledger, record: UnknownRecord): void {
  recordMean(ledger, record.curve, record.unknown, record.readings);
  const { back, budget } = record;
  if (back) recordReadBack(ledger, record, back);
  if (back && budget) {
    const { unit, confidence } = record.curve.request;
    const { scaling } = record;
    recordBudget(ledger, { unit, confidence, scaling, budget, nuFrom: ['curve.degreesOfFreedom'] });
  }
  recordCritical(ledger, record.curve, record.critical, 'unknown');
  recordReport(ledger, record.unknown, budget !== null, ['unknown.critical'], record.report);
}
