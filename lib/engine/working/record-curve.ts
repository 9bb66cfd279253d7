import type { FittedCurve } from '../fit-curve';
import type { CurvePoint } from '../prepare-points';
import type { MolarAbsorptivity } from '../types';
import type { Measuring } from '../unknown/measuring';
import { recordCoefficients } from './record-coefficients';
import { recordEpsilon } from './record-epsilon';
import type { Ledger } from './ledger';
import { blankLineId, recordReading } from './record-readings';
import { recordWeights } from './record-weights';

/** Ids of the lines a point enters the fit by. */
export interface PointIds {
  readonly x: string;
  readonly y: string;
  readonly l: string;
}

/** The derivation of the curve, from the readings of its standards to its coefficients and what follows. */
export function recordCurve(
  ledger: Ledger,
  curve: FittedCurve,
  epsilon: MolarAbsorptivity | undefined,
): void {
  recordBlanks(ledger, curve);
  const ids = recordPoints(ledger, curve);
  ledger.given({ id: 'curve.n', label: 'Readings in the fit', symbol: 'n', source: 'count' }, curve.fit.n);
  const weightIds = recordWeights(ledger, curve, ids);
  recordCoefficients(ledger, curve, ids, weightIds);
  recordEpsilon(ledger, curve, epsilon);
}

export function recordBlanks(
  ledger: Ledger,
  { blanks, request }: Pick<Measuring, 'blanks' | 'request'>,
): void {
  if (blanks.use !== 'subtract') return;
  const paths = [...new Set(blanks.readings.map((blank) => blank.pathLengthMm))];
  const noBlank = { ...blanks, use: 'none' as const };
  for (const pathLengthMm of paths) {
    const same = blanks.readings.filter((blank) => blank.pathLengthMm === pathLengthMm);
    const ids = same.map((blank, i) =>
      recordReading(ledger, request, noBlank, {
        id: `curve.blankReading.${pathLengthMm}.${i + 1}`,
        label: `Blank at ${pathLengthMm} mm, reading ${i + 1}`,
        reading: blank.reading,
        asRead: blank.absorbance,
        // As read: the blank is subtracted before the path is normalised.
        pathLengthMm: 10,
        pathId: '',
        y: blank.asRead,
      }),
    );
    const countId = `curve.blankCount.${pathLengthMm}`;
    ledger.given(
      { id: countId, label: `Blank readings at ${pathLengthMm} mm`, symbol: 'p_b', source: 'count' },
      same.length,
    );
    ledger.sum(
      {
        id: blankLineId(pathLengthMm),
        label: `Mean blank at ${pathLengthMm} mm`,
        symbol: 'A_blank',
        source: 'mean of the blank readings',
      },
      'A',
      ids.map((id) => ({ A: id })),
      blanks.meanAt(pathLengthMm, '') as number,
      { p_b: countId },
    );
  }
}

/** Concentration, path and reading of every point; returns those of the points in the fit. */
function recordPoints(ledger: Ledger, curve: FittedCurve): readonly PointIds[] {
  const known = new Set<string>();
  const once = (id: string, record: () => void) => {
    if (!known.has(id)) record();
    known.add(id);
  };
  const idsOf = (point: CurvePoint): PointIds => {
    const owner = point.standardIndex === null ? 'curve.blank' : `curve.standard.${point.standardIndex + 1}`;
    const x = `${owner}.concentration`;
    const l = `${owner}.path${point.standardIndex === null ? `.${point.pathLengthMm}` : ''}`;
    const { unit } = curve.request;
    once(x, () =>
      ledger.given(
        { id: x, label: `Concentration of ${point.name}`, symbol: 'x', unit, source: 'given' },
        point.concentration,
      ),
    );
    once(l, () =>
      ledger.given(
        { id: l, label: `Path length of ${point.name}`, symbol: 'l', unit: 'mm', source: 'given' },
        point.pathLengthMm,
      ),
    );
    const blanks = point.role === 'blank' ? { ...curve.blanks, use: 'none' as const } : curve.blanks;
    const y = recordReading(ledger, curve.request, blanks, {
      id: point.id,
      label: `${point.name}, reading ${point.replicate}`,
      reading: point.reading,
      asRead: point.asRead,
      pathLengthMm: point.pathLengthMm,
      pathId: l,
      y: point.y,
    });
    return { x, y, l };
  };
  const all = curve.points.map((point) => ({ point, ids: idsOf(point) }));
  return all.filter(({ point }) => point.excludedBecause === undefined).map(({ ids }) => ids);
}
