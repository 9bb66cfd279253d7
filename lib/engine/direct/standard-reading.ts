import { absorbanceOf } from '../absorbance';
import type { Blanks } from '../blanks';
import { EngineError } from '../errors';
import { normalise } from '../prepare-points';
import type { Reading } from '../types';
import type { Ledger } from '../working/ledger';
import { recordReading } from '../working/record-readings';
import { knownSd } from './direct-blanks';
import { type MeanReading, meanReading } from './mean-reading';
import type { DirectRequest } from './types';

/** The mean of a standard per 10 mm after the blank, with what its working needs. */
export interface StandardReading extends MeanReading {
  record(ledger: Ledger, id: string, label: string, symbol: string): void;
}

/**
 * Readings of a standard in the cell of the request. One without a number is refused: nothing can be compared
 * with it.
 *
 * @throws EngineError STANDARD_WITHOUT_NUMBER
 */
export function standardReading(
  request: DirectRequest,
  blanks: Blanks,
  readings: readonly Reading[],
  pointer: string,
): StandardReading {
  const { signal, pathLengthMm } = request;
  const items = readings.map((reading, i) => {
    const at = `${pointer}/${i}`;
    const asRead = absorbanceOf(reading, signal, at);
    if (asRead.value === null) {
      throw new EngineError(
        'STANDARD_WITHOUT_NUMBER',
        'every reading of a standard that unknowns are compared with must be a number',
        at,
      );
    }
    return { reading, asRead, y: normalise(asRead.value, blanks.meanAt(pathLengthMm, at), pathLengthMm) };
  });
  const mean = meanReading(
    items.map((item) => item.y),
    knownSd(request, pathLengthMm),
  );
  return {
    ...mean,
    record: (ledger, id, label, symbol) => {
      ledger.given(
        { id: `${id}.path`, label: `Path length of ${label}`, symbol: 'l', unit: 'mm', source: 'given' },
        pathLengthMm,
      );
      const ids = items.map(({ reading, asRead, y }, i) =>
        recordReading(ledger, request, blanks, {
          id: `${id}.${i + 1}`,
          label: `${label}, reading ${i + 1}`,
          reading,
          asRead,
          pathLengthMm,
          pathId: `${id}.path`,
          y,
        }),
      );
      ledger.given(
        { id: `${id}.p`, label: `Readings of ${label}`, symbol: 'p', source: 'count' },
        items.length,
      );
      ledger.sum(
        { id, label: `Mean absorbance of ${label} per 10 mm`, symbol, source: 'mean of the readings' },
        'y',
        ids.map((line) => ({ y: line })),
        mean.mean,
        { p: `${id}.p` },
      );
      recordMeanU(ledger, mean, { id: `${id}.u`, of: label, inputs: ids, p: `${id}.p` });
    },
  };
}

/** Line of the standard uncertainty of a mean reading. */
export function recordMeanU(
  ledger: Ledger,
  mean: MeanReading,
  text: { readonly id: string; readonly of: string; readonly inputs: readonly string[]; readonly p: string },
): void {
  const how =
    mean.sd === null
      ? 'one reading of unknown scatter: none'
      : Number.isFinite(mean.degreesOfFreedom)
        ? 's / sqrt(p), s of the readings'
        : 's / sqrt(p), s as stated';
  ledger.solved(
    {
      id: text.id,
      label: `Standard uncertainty of the mean of ${text.of}`,
      symbol: 'u(y)',
      source: 'JCGM 100 (GUM), 4.2',
    },
    how,
    // One reading, or a scatter stated beforehand, does not depend on what was read.
    Number.isFinite(mean.degreesOfFreedom) ? [...text.inputs, text.p] : [text.p],
    mean.u,
  );
}
