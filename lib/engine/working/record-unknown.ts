import type { CriticalValue } from '../calibration/critical-value';
import type { FittedCurve } from '../fit-curve';
import type { UnknownRequest } from '../types';
import { isOtherCell } from '../unknown/budget';
import type { Expanded } from '../uncertainty/combine';
import type { ConvertedReadings } from '../unknown/convert-readings';
import type { ReadBack } from '../unknown/read-back';
import type { Scaling } from '../unknown/scaling';
import type { Ledger } from './ledger';
import { recordBudget } from './record-budget';
import { recordReadBack } from './record-read-back';
import { recordCritical } from './record-critical';
import { recordReading } from './record-readings';

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
  const ids = recordReadings(ledger, record);
  const { readings, back, budget } = record;
  if (readings.meanY !== null) {
    ledger.given(
      { id: 'unknown.p', label: 'Readings in the mean', symbol: 'p', source: 'count' },
      readings.y.length,
    );
    ledger.sum(
      {
        id: 'unknown.mean',
        label: 'Mean absorbance per 10 mm',
        symbol: 'y0',
        source: 'mean of the readings',
      },
      'y',
      ids.map((id) => ({ y: id })),
      readings.meanY,
      { p: 'unknown.p' },
    );
  }
  if (back) recordReadBack(ledger, record, back);
  if (back && budget) {
    const { unit, confidence } = record.curve.request;
    const { scaling } = record;
    recordBudget(ledger, { unit, confidence, scaling, budget, nuFrom: ['curve.degreesOfFreedom'] });
  }
  recordReport(ledger, record);
}

/** Lines of the readings; returns the ids of the last line of each that is in the mean. */
function recordReadings(ledger: Ledger, { curve, unknown, readings }: UnknownRecord): readonly string[] {
  const { request, blanks } = curve;
  ledger.given(
    { id: 'unknown.path', label: 'Path length of the unknown', symbol: 'l', unit: 'mm', source: 'given' },
    readings.pathLengthMm,
  );
  if (isOtherCell(curve, unknown)) {
    ledger.given(
      {
        id: 'unknown.standardsPath',
        label: 'Path length of the standards',
        symbol: 'l',
        unit: 'mm',
        source: 'given',
      },
      request.pathLengthMm,
    );
  }
  const last = unknown.readings.map((reading, i) =>
    recordReading(ledger, request, blanks, {
      id: `unknown.reading.${i + 1}`,
      label: `Reading ${i + 1}`,
      reading,
      asRead: readings.asRead[i] ?? { value: null },
      pathLengthMm: readings.pathLengthMm,
      pathId: 'unknown.path',
      y: readings.y[readings.used.indexOf(i)] ?? null,
    }),
  );
  return readings.used.map((i) => last[i] ?? '');
}

function recordReport(ledger: Ledger, { curve, critical, budget, unknown, report }: UnknownRecord): void {
  recordCritical(ledger, curve, critical, 'unknown');
  const readingIds = unknown.readings.map((_, i) => `unknown.reading.${i + 1}.reading`);
  ledger.solved(
    {
      id: 'unknown.report',
      label: 'What is reported',
      symbol: 'report',
      source: 'report rules of this notebook',
    },
    'the first case that applies',
    [...(budget ? ['unknown.result', 'unknown.U'] : readingIds), 'unknown.critical'],
    report,
  );
}
