import type { FittedCurve } from '../fit-curve';
import { coefficientOf } from '../regression/fit';
import type { From, Ledger } from './ledger';
import type { PointIds } from './record-curve';

const CG4 = 'EURACHEM/CITAC CG 4, example A5';
const FIT = 'weighted least squares';

/** What the sums of a fit are made from. */
interface Sums {
  readonly ledger: Ledger;
  readonly curve: FittedCurve;
  readonly unit: string;
  /** "w * " under weights. */
  readonly w: string;
  /** Lines behind x, y and w of each point. */
  readonly terms: readonly From[];
}

/** Lines of the coefficients, the residual standard deviation and their uncertainties. */
export function recordCoefficients(
  ledger: Ledger,
  curve: FittedCurve,
  ids: readonly PointIds[],
  weightIds: readonly string[] | null,
): void {
  const terms = ids.map(({ x, y }, i): From => ({
    x,
    y,
    ...(weightIds ? { w: weightIds[i] as string } : {}),
  }));
  const sums = { ledger, curve, unit: curve.request.unit, w: weightIds ? 'w * ' : '', terms };
  if (curve.fit.model === 'linear') recordLine(sums);
  else if (curve.fit.model === 'proportional') recordProportional(sums);
  else recordQuadratic(sums);
}

const only = (from: From, ...symbols: readonly string[]): From =>
  Object.fromEntries(
    symbols.flatMap((symbol) => (from[symbol] === undefined ? [] : [[symbol, from[symbol]]])),
  );

function recordLine(sums: Sums): void {
  const { ledger, curve, unit, w, terms } = sums;
  const { fit } = curve;
  const means = { xbar: 'curve.xbar', ybar: 'curve.ybar' };
  const text = (id: string, label: string, symbol: string, of = '') => ({
    id: `curve.${id}`,
    label,
    symbol,
    unit: of,
    source: FIT,
  });
  ledger.sum(
    text('xbar', 'Mean concentration', 'xbar', unit),
    `${w}x`,
    terms.map((t) => only(t, 'x', 'w')),
    fit.meanX,
    { n: 'curve.n' },
  );
  ledger.sum(
    text('ybar', 'Mean absorbance', 'ybar'),
    `${w}y`,
    terms.map((t) => only(t, 'y', 'w')),
    fit.meanY,
    { n: 'curve.n' },
  );
  ledger.sum(
    text('sxx', 'Spread of the concentrations', 'Sxx'),
    `${w}(x - xbar)^2`,
    terms.map((t) => ({ ...only(t, 'x', 'w'), xbar: means.xbar })),
    fit.sxx,
  );
  const [offset, b] = fit.beta as readonly [number, number];
  ledger.sum(
    text('sxy', 'Spread shared with the absorbances', 'Sxy'),
    `${w}(x - xbar) * (y - ybar)`,
    terms.map((t) => ({ ...t, ...means })),
    b * fit.sxx,
  );
  ledger.line(
    text('slope', 'Slope, per 10 mm', 'b', `1/(${unit})`),
    'Sxy / Sxx',
    { Sxy: 'curve.sxy', Sxx: 'curve.sxx' },
    b,
  );
  ledger.line(
    text('intercept', 'Intercept, per 10 mm', 'a'),
    'ybar - b * xbar',
    { ...means, b: 'curve.slope' },
    offset - b * fit.meanX,
  );
  recordResidualSd(sums, 'a + b * x');
  const from = { s: 'curve.s', n: 'curve.n', xbar: 'curve.xbar', Sxx: 'curve.sxx' };
  const u = (id: string, label: string, symbol: string) => ({ ...text(id, label, symbol), source: CG4 });
  ledger.line(
    u('u.slope', 'Standard uncertainty of the slope', 'u(b)'),
    's / sqrt(Sxx)',
    { s: from.s, Sxx: from.Sxx },
    coefficientOf(fit, 1).u,
  );
  ledger.line(
    u('v.intercept', 'Variance of the intercept', 'V_aa'),
    's^2 * (1 / n + xbar^2 / Sxx)',
    from,
    coefficientOf(fit, 0).u ** 2,
  );
  ledger.line(
    u('u.intercept', 'Standard uncertainty of the intercept', 'u(a)'),
    'sqrt(V_aa)',
    { V_aa: 'curve.v.intercept' },
    coefficientOf(fit, 0).u,
  );
  ledger.line(
    u('v.both', 'Covariance of intercept and slope', 'V_ab'),
    '-xbar * s^2 / Sxx',
    { s: from.s, xbar: from.xbar, Sxx: from.Sxx },
    (fit.covariance[0] as readonly number[])[1] as number,
  );
}

function recordProportional(sums: Sums): void {
  const { ledger, curve, unit, w, terms } = sums;
  const { fit, data } = curve;
  const squares = data.x.reduce((sum, x, i) => sum + (data.w[i] as number) * x * x, 0);
  const b = fit.beta[1] as number;
  const text = (id: string, label: string, symbol: string, of = '') => ({
    id: `curve.${id}`,
    label,
    symbol,
    unit: of,
    source: FIT,
  });
  ledger.sum(
    text('sx2', 'Sum of squared concentrations', 'Sx2'),
    `${w}x^2`,
    terms.map((t) => only(t, 'x', 'w')),
    squares,
  );
  ledger.sum(text('sxy', 'Sum of products', 'Sxy'), `${w}x * y`, terms, b * squares);
  ledger.line(
    text('slope', 'Slope, per 10 mm', 'b', `1/(${unit})`),
    'Sxy / Sx2',
    { Sxy: 'curve.sxy', Sx2: 'curve.sx2' },
    b,
  );
  ledger.given({ ...text('intercept', 'Intercept', 'a'), source: 'line through zero' }, 0);
  recordResidualSd(sums, 'b * x');
  ledger.line(
    { ...text('u.slope', 'Standard uncertainty of the slope', 'u(b)'), source: CG4 },
    's / sqrt(Sx2)',
    { s: 'curve.s', Sx2: 'curve.sx2' },
    coefficientOf(fit, 1).u,
  );
  ledger.given(
    { ...text('v.intercept', 'Variance of the intercept', 'V_aa'), source: 'line through zero' },
    0,
  );
}

function recordQuadratic(sums: Sums): void {
  const { ledger, curve, terms } = sums;
  const { fit } = curve;
  const inputs = [...new Set(terms.flatMap((from) => Object.values(from)))];
  const names = ['intercept', 'slope', 'quadratic'] as const;
  const symbols = ['a', 'b', 'd'];
  names.forEach((name, i) => {
    const label = { intercept: 'Intercept', slope: 'Slope at zero', quadratic: 'Quadratic coefficient' }[
      name
    ];
    ledger.solved(
      {
        id: `curve.${name}`,
        label: `${label}, per 10 mm`,
        symbol: symbols[i] as string,
        source: 'ISO 8466-2',
      },
      'least squares of y = a + b*x + d*x^2',
      inputs,
      fit.coefficients[i] as number,
    );
  });
  recordResidualSd(sums, 'a + b * x + d * x^2');
  names.forEach((name, i) => {
    ledger.solved(
      {
        id: `curve.v.${name}`,
        label: `Variance of the ${name} coefficient`,
        symbol: `V_${symbols[i]}${symbols[i]}`,
        source: FIT,
      },
      's^2 (X^T W X)^-1',
      ['curve.s', ...inputs],
      (fit.covariance[i] as readonly number[])[i] as number,
    );
  });
}

function recordResidualSd({ ledger, curve, w, terms }: Sums, fitted: string): void {
  const { fit } = curve;
  const text = (id: string, label: string, symbol: string) => ({
    id: `curve.${id}`,
    label,
    symbol,
    source: FIT,
  });
  const coefficients: From = {
    ...(fit.model === 'proportional' ? {} : { a: 'curve.intercept' }),
    b: 'curve.slope',
    ...(fit.model === 'quadratic' ? { d: 'curve.quadratic' } : {}),
  };
  ledger.sum(
    text('residualSquares', 'Sum of squared residuals', 'SSE'),
    `${w}(y - (${fitted}))^2`,
    terms.map((t) => ({ ...t, ...coefficients })),
    fit.residualSquares,
  );
  ledger.line(
    text('degreesOfFreedom', 'Degrees of freedom', 'nu'),
    `n - ${fit.q}`,
    { n: 'curve.n' },
    fit.degreesOfFreedom,
  );
  ledger.line(
    text('s', 'Residual standard deviation', 's'),
    'sqrt(SSE / nu)',
    { SSE: 'curve.residualSquares', nu: 'curve.degreesOfFreedom' },
    fit.residualSd,
  );
}
