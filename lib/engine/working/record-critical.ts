import type { CriticalValue } from '../calibration/critical-value';
import type { FittedCurve } from '../fit-curve';
import type { Ledger } from './ledger';

/** Lines of a critical value, for the curve or for one unknown (`owner` is the prefix of the ids). */
export function recordCritical(
  ledger: Ledger,
  curve: FittedCurve,
  critical: CriticalValue,
  owner: 'curve' | 'unknown',
): void {
  const source = 'ISO 11843-2';
  ledger.given(
    { id: `${owner}.critical.readings`, label: 'Readings of an unknown', symbol: 'K', source: 'count' },
    critical.readings,
  );
  ledger.solved(
    { id: `${owner}.critical.t`, label: 'One-sided 95 % point of t', symbol: 't', source },
    't(0.95; nu)',
    ['curve.degreesOfFreedom'],
    critical.t,
  );
  const text = {
    id: `${owner}.critical`,
    label: 'Critical value, in the measured solution',
    symbol: 'x_C',
    unit: curve.request.unit,
    source,
  };
  const K = `${owner}.critical.readings`;
  const t = `${owner}.critical.t`;
  if (curve.fit.model === 'linear' && critical.weight === 1) {
    const from = { t, s: 'curve.s', b: 'curve.slope', K, n: 'curve.n', xbar: 'curve.xbar', Sxx: 'curve.sxx' };
    ledger.line(text, 't * (s / abs(b)) * sqrt(1 / K + 1 / n + xbar^2 / Sxx)', from, critical.value);
    return;
  }
  ledger.solved(
    {
      id: `${owner}.critical.weight`,
      label: 'Weight of a reading at zero',
      symbol: 'w_0',
      source: `weighting ${curve.request.weighting} and path`,
    },
    'in the scale of the points of the curve',
    weightInputs(ledger, curve, owner === 'unknown' ? ['unknown.path'] : []),
    critical.weight,
  );
  ledger.line(
    text,
    't * sqrt(s^2 / (K * w_0) + V_aa) / abs(b)',
    { t, s: 'curve.s', K, w_0: `${owner}.critical.weight`, V_aa: 'curve.v.intercept', b: 'curve.slope' },
    critical.value,
  );
}

/** Lines that a weight in the scale of the curve's points rests on. */
export function weightInputs(ledger: Ledger, curve: FittedCurve, own: readonly string[]): readonly string[] {
  const variances = curve.active.map((point) => `${point.id}.variance`);
  return ledger.present(['curve.weightScale', ...variances, ...own]);
}
