import type { ReadBack } from '../unknown/read-back';
import type { Ledger } from './ledger';
import { weightInputs } from './record-critical';
import type { UnknownRecord } from './record-unknown';

const CG4 = 'EURACHEM/CITAC CG 4, example A5';
const A5 = '(s / abs(b)) * sqrt(1 / p + 1 / n + (c - xbar)^2 / Sxx)';

/** Lines from the mean absorbance to the concentration in the measured solution and its standard uncertainty. */
export function recordReadBack(ledger: Ledger, record: UnknownRecord, back: ReadBack): void {
  recordConcentration(ledger, record, back);
  recordReadingSd(ledger, record, back);
  const { unit } = record.curve.request;
  const { fit } = record.curve;
  const slopeId = fit.model === 'quadratic' ? 'unknown.slope' : 'curve.slope';
  ledger.line(
    {
      id: 'unknown.u.readings',
      label: 'Uncertainty from the readings',
      symbol: 'u_readings',
      unit,
      source: CG4,
    },
    's_y0 / (abs(b) * sqrt(p))',
    { s_y0: 'unknown.readingSd', b: slopeId, p: 'unknown.p' },
    back.uReadings,
  );
  recordCurveU(ledger, record, back);
  const text = {
    id: 'unknown.u.measured',
    label: 'Standard uncertainty in the measured solution',
    symbol: 'u(c)',
    unit,
    source: CG4,
  };
  const plain = fit.model === 'linear' && back.weight === 1 && !back.replicates.own;
  if (plain) ledger.line(text, A5, { ...fromLine, s: 'curve.s', b: 'curve.slope', p: 'unknown.p' }, back.u);
  else
    ledger.line(
      text,
      'sqrt(u_readings^2 + u_curve^2)',
      { u_readings: 'unknown.u.readings', u_curve: 'unknown.u.curve' },
      back.u,
    );
}

const fromLine = { n: 'curve.n', c: 'unknown.measured', xbar: 'curve.xbar', Sxx: 'curve.sxx' };

function recordConcentration(ledger: Ledger, { curve }: UnknownRecord, back: ReadBack): void {
  const { unit } = curve.request;
  const text = { id: 'unknown.measured', label: 'Concentration in the measured solution', symbol: 'c', unit };
  if (curve.fit.model === 'linear') {
    ledger.line(
      { ...text, source: 'the line solved for c' },
      '(y0 - a) / b',
      { y0: 'unknown.mean', a: 'curve.intercept', b: 'curve.slope' },
      back.c,
    );
  } else if (curve.fit.model === 'proportional') {
    ledger.line(
      { ...text, source: 'the line solved for c' },
      'y0 / b',
      { y0: 'unknown.mean', b: 'curve.slope' },
      back.c,
    );
  } else {
    const inputs = ['unknown.mean', 'curve.intercept', 'curve.slope', 'curve.quadratic'];
    ledger.solved(
      { ...text, source: 'ISO 8466-2' },
      'the root of a + b*c + d*c^2 = y0 among the standards',
      inputs,
      back.c,
    );
    ledger.line(
      { id: 'unknown.slope', label: 'Slope of the curve there', symbol: 'b_c', source: 'derivative' },
      'b + 2 * d * c',
      { b: 'curve.slope', d: 'curve.quadratic', c: 'unknown.measured' },
      back.slope,
    );
  }
}

function recordReadingSd(ledger: Ledger, { curve, readings }: UnknownRecord, back: ReadBack): void {
  const text = { id: 'unknown.readingSd', label: 'Standard deviation of one reading', symbol: 's_y0' };
  if (back.replicates.own) {
    const ids = readings.used.map((i) => `unknown.reading.${i + 1}.reading`);
    ledger.solved(
      { ...text, source: 'the replicates disagree; their own is the larger' },
      'standard deviation of the replicates',
      ids,
      back.replicates.sd,
    );
  } else if (back.weight === 1) {
    ledger.line(
      { ...text, source: 'residual standard deviation of the curve' },
      's',
      { s: 'curve.s' },
      back.replicates.sd,
    );
  } else {
    const needsMean = curve.request.weighting !== 'none';
    ledger.solved(
      {
        id: 'unknown.weight',
        label: 'Weight of one reading there',
        symbol: 'w_0',
        source: `weighting ${curve.request.weighting} and path`,
      },
      'in the scale of the points of the curve',
      weightInputs(ledger, curve, needsMean ? ['unknown.measured', 'unknown.path'] : ['unknown.path']),
      back.weight,
    );
    ledger.line(
      { ...text, source: 's divided by the root of the weight' },
      's / sqrt(w_0)',
      { s: 'curve.s', w_0: 'unknown.weight' },
      back.replicates.sd,
    );
  }
}

function recordCurveU(ledger: Ledger, { curve }: UnknownRecord, back: ReadBack): void {
  const { fit, request } = curve;
  const text = {
    id: 'unknown.u.curve',
    label: 'Uncertainty from the curve',
    symbol: 'u_curve',
    unit: request.unit,
    source: CG4,
  };
  if (fit.model === 'linear') {
    ledger.line(
      text,
      '(s / abs(b)) * sqrt(1 / n + (c - xbar)^2 / Sxx)',
      { ...fromLine, s: 'curve.s', b: 'curve.slope' },
      back.uCurve,
    );
  } else if (fit.model === 'proportional') {
    ledger.line(
      text,
      'abs(c) * u(b) / abs(b)',
      { c: 'unknown.measured', 'u(b)': 'curve.u.slope', b: 'curve.slope' },
      back.uCurve,
    );
  } else {
    ledger.solved(
      text,
      'sqrt(g * V * g) / slope there, g = (1, c, c^2)',
      ['unknown.measured', 'unknown.slope', 'curve.s'],
      back.uCurve,
    );
  }
}
