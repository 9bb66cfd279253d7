import type { FittedCurve } from '../fit-curve';
import type { Ledger } from './ledger';
import type { PointIds } from './record-curve';

const MODEL = 'weights scaled so that they add up to n';

const VARIANCE_FORMULA = { '1/x': 'x', '1/x2': 'x^2' } as const;

/** Lines of the weights; returns their ids, or null when every weight is 1. */
export function recordWeights(
  ledger: Ledger,
  curve: FittedCurve,
  ids: readonly PointIds[],
): readonly string[] | null {
  const { data, active, request, rule } = curve;
  if (data.w.every((w) => w === 1)) return null;
  const byFormula = request.weighting in VARIANCE_FORMULA;
  const constant = request.weighting === 'none';
  const everything = [...new Set(ids.flatMap((id) => [id.x, id.y, id.l]))];
  const ofLevel = (x: number) => ids.filter((_, i) => data.x[i] === x).flatMap((id) => [id.y, id.l]);
  active.forEach((point, i) => {
    const text = {
      id: `${point.id}.variance`,
      label: `${point.name}, reading ${point.replicate}: variance up to a factor`,
      symbol: 'v',
      source: `weighting ${request.weighting}`,
    };
    const value = rule.ofPoints[i] as number;
    if (constant) ledger.given(text, value);
    else if (byFormula) {
      const formula = VARIANCE_FORMULA[request.weighting as keyof typeof VARIANCE_FORMULA];
      ledger.line(text, formula, { x: (ids[i] as PointIds).x }, value);
    } else if (request.weighting === 'given') ledger.solved(text, '1 / w as given', [], value);
    else {
      const inputs =
        request.weighting === 'replicates' ? [...new Set(ofLevel(point.concentration))] : everything;
      ledger.solved(text, VARIANCE_WORDS[request.weighting] as string, inputs, value);
    }
  });
  const terms = active.map((point, i) => ({ l: (ids[i] as PointIds).l, v: `${point.id}.variance` }));
  ledger.solved(
    { id: 'curve.weightScale', label: 'Factor of the weights', symbol: 'kappa', source: MODEL },
    'n / sum((l / 10)^2 / v)',
    ['curve.n', ...new Set(terms.flatMap((term) => [term.l, term.v]))],
    curve.weightScale,
  );
  return active.map((point, i) => {
    const id = `${point.id}.weight`;
    ledger.line(
      { id, label: `${point.name}, reading ${point.replicate}: weight`, symbol: 'w', source: MODEL },
      'kappa * (l / 10)^2 / v',
      { kappa: 'curve.weightScale', l: (ids[i] as PointIds).l, v: `${point.id}.variance` },
      data.w[i] as number,
    );
    return id;
  });
}

const VARIANCE_WORDS: Readonly<Record<string, string>> = {
  '1/y': 'the value fitted without weights',
  '1/y2': 'the value fitted without weights, squared',
  varianceFunction: 's0^2 + (k * yhat)^2, yhat fitted without weights',
  replicates: 'variance of the readings of its level',
};
