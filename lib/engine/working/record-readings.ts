import { type Absorbance, readingText } from '../absorbance';
import type { Blanks } from '../blanks';
import { NORMAL_PATH_MM } from '../prepare-points';
import type { CurveRequest, Reading, TwoWavelengthReading } from '../types';
import type { Ledger } from './ledger';

/** One reading with everything done to it. */
export interface ReadingToRecord {
  /** Prefix of its lines. */
  readonly id: string;
  readonly label: string;
  readonly reading: Reading;
  readonly asRead: Absorbance;
  readonly pathLengthMm: number;
  /** Id of the path's line. */
  readonly pathId: string;
  /** Per 10 mm after the blank. */
  readonly y: number | null;
}

const LAW = 'Beer-Lambert law; measurement order of this notebook';

const DIFFERENCE = {
  absorbance: 'A_1 - A_2',
  transmittance: '-log10(T_1) + log10(T_2)',
  percentTransmittance: '-log10(%T_1 / 100) + log10(%T_2 / 100)',
} as const;

const SIGNAL_SYMBOL = { absorbance: 'A', transmittance: 'T', percentTransmittance: '%T' } as const;

export function blankLineId(pathLengthMm: number): string {
  return `curve.blankMean.${pathLengthMm}`;
}

/** Lines of one reading: as it came, as absorbance, after its blank, per 10 mm. Returns the id of the last one. */
export function recordReading(
  ledger: Ledger,
  request: Pick<CurveRequest, 'signal'>,
  blanks: Blanks,
  item: ReadingToRecord,
): string {
  const { id, label } = item;
  const symbol = SIGNAL_SYMBOL[request.signal];
  const unit = request.signal === 'percentTransmittance' ? '%' : '';
  if (typeof item.reading === 'object')
    return recordDifference(ledger, request, blanks, { ...item, reading: item.reading });
  ledger.given(
    { id: `${id}.reading`, label: `${label}, as it came`, symbol, unit, source: 'reading' },
    item.reading,
  );
  if (item.asRead.value === null) return `${id}.reading`;
  let last = `${id}.reading`;
  if (request.signal !== 'absorbance') {
    const expression = request.signal === 'transmittance' ? '-log10(T)' : '-log10(%T / 100)';
    ledger.line(
      {
        id: `${id}.absorbance`,
        label: `${label}, absorbance`,
        symbol: 'A',
        source: 'A = -log10(T), Ph. Eur. 2.2.25',
      },
      expression,
      { [symbol]: last },
      item.asRead.value,
    );
    last = `${id}.absorbance`;
  }
  return recordNormalised(ledger, blanks, item, last);
}

/** Two wavelengths: both readings as they came, and the difference of their absorbances. */
function recordDifference(
  ledger: Ledger,
  request: Pick<CurveRequest, 'signal'>,
  blanks: Blanks,
  item: ReadingToRecord & { readonly reading: TwoWavelengthReading },
): string {
  const { id, label, reading } = item;
  const symbol = SIGNAL_SYMBOL[request.signal];
  const unit = request.signal === 'percentTransmittance' ? '%' : '';
  const given = (which: 'main' | 'minus', place: string, index: number) =>
    ledger.given(
      {
        id: `${id}.${which}`,
        label: `${label}, ${place}`,
        symbol: `${symbol}_${index}`,
        unit,
        source: 'reading',
      },
      reading[which],
    );
  given('main', 'as it came', 1);
  given('minus', 'as it came at the second wavelength', 2);
  const absorbance = DIFFERENCE[request.signal];
  ledger.line(
    { id: `${id}.reading`, label: `${label}, second wavelength taken off`, symbol: 'A', source: LAW },
    absorbance,
    { [`${symbol}_1`]: `${id}.main`, [`${symbol}_2`]: `${id}.minus` },
    item.asRead.value ?? readingText(reading),
  );
  return item.asRead.value === null
    ? `${id}.reading`
    : recordNormalised(ledger, blanks, item, `${id}.reading`);
}

function recordNormalised(
  ledger: Ledger,
  blanks: Blanks,
  item: ReadingToRecord,
  absorbanceId: string,
): string {
  const withBlank = blanks.use === 'subtract';
  const withPath = item.pathLengthMm !== NORMAL_PATH_MM;
  if (!withBlank && !withPath) return absorbanceId;
  const net = withBlank ? '(A - A_blank)' : 'A';
  const expression = withPath ? `${net} * 10 / l` : 'A - A_blank';
  ledger.line(
    { id: `${item.id}.y`, label: `${item.label}, after blank and per 10 mm`, symbol: 'y', source: LAW },
    expression,
    {
      A: absorbanceId,
      ...(withBlank ? { A_blank: blankLineId(item.pathLengthMm) } : {}),
      ...(withPath ? { l: item.pathId } : {}),
    },
    item.y as number,
  );
  return `${item.id}.y`;
}
