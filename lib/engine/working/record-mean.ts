import type { Absorbance } from '../absorbance';
import type { UnknownRequest } from '../types';
import { isOtherCell } from '../unknown/budget';
import type { ConvertedReadings } from '../unknown/convert-readings';
import type { Measuring } from '../unknown/measuring';
import type { Ledger } from './ledger';
import { recordReading } from './record-readings';

/** Lines from the readings of an unknown, as they came, to their mean per 10 mm. */
export function recordMean(
  ledger: Ledger,
  measuring: Pick<Measuring, 'request' | 'blanks'>,
  unknown: UnknownRequest,
  readings: ConvertedReadings,
): void {
  const ids = recordReadings(ledger, measuring, unknown, readings);
  if (readings.meanY === null) return;
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

/** Lines of the readings; returns the ids of the last line of each that is in the mean. */
function recordReadings(
  ledger: Ledger,
  { request, blanks }: Pick<Measuring, 'request' | 'blanks'>,
  unknown: UnknownRequest,
  readings: ConvertedReadings,
): readonly string[] {
  ledger.given(
    { id: 'unknown.path', label: 'Path length of the unknown', symbol: 'l', unit: 'mm', source: 'given' },
    readings.pathLengthMm,
  );
  if (isOtherCell({ request }, unknown)) {
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
      asRead: readings.asRead[i] as Absorbance,
      pathLengthMm: readings.pathLengthMm,
      pathId: 'unknown.path',
      y: readings.y[readings.used.indexOf(i)] ?? null,
    }),
  );
  return readings.used.map((i) => last[i] as string);
}
