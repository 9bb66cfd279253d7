import type { CurveResult, Model } from '@/lib/engine';
import { NOINT1, NOINT2, NORRIS, PONTIUS } from '../datasets/nist-strd';
import { lineOf, type PublishedLine } from '../line-of';
import { type CheckRow, type CheckSource, sourceOf } from '../types';

type Certified = Partial<Record<keyof typeof VALUE_OF, string>>;

const NAME_OF = {
  B0: 'intercept',
  B1: 'slope',
  B2: 'quadratic coefficient',
  sdB0: 'standard deviation of the intercept',
  sdB1: 'standard deviation of the slope',
  sdB2: 'standard deviation of the quadratic coefficient',
  residualSd: 'residual standard deviation',
  rSquared: 'r²',
};

const VALUE_OF = {
  B0: (curve: CurveResult) => curve.intercept.value,
  B1: (curve: CurveResult) => curve.slope.value,
  B2: (curve: CurveResult) => curve.quadratic?.value ?? NaN,
  sdB0: (curve: CurveResult) => curve.intercept.u,
  sdB1: (curve: CurveResult) => curve.slope.u,
  sdB2: (curve: CurveResult) => curve.quadratic?.u ?? NaN,
  residualSd: (curve: CurveResult) => curve.residualSd,
  rSquared: (curve: CurveResult) => curve.rSquared,
};

function dataset(
  id: string,
  title: string,
  model: Model,
  data: PublishedLine & { readonly certified: Certified },
): CheckSource {
  const answer = lineOf(data, [], { model });
  const keys = Object.keys(data.certified) as (keyof Certified)[];
  const rows = keys.map((key): CheckRow => [
    NAME_OF[key],
    data.certified[key] ?? '',
    () => VALUE_OF[key](answer().curve),
  ]);
  return sourceOf({
    id,
    title,
    source: 'NIST, Statistical Reference Datasets, linear least squares, certified values',
    kind: 'seen in print',
    rows: rows,
  });
}

/** Regression data made to be hard on arithmetic, with values certified to 15 digits. */
export function nistStrd(): readonly CheckSource[] {
  return [
    dataset('norris', 'Norris: a straight line', 'linear', NORRIS),
    dataset('pontius', 'Pontius: a quadratic', 'quadratic', PONTIUS),
    dataset('noint1', 'NoInt1: a line through zero', 'proportional', NOINT1),
    dataset('noint2', 'NoInt2: a line through zero, three points', 'proportional', NOINT2),
  ];
}
