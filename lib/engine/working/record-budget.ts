import type { BudgetTerm, Expanded } from '../unknown/budget';
import type { ReadBack } from '../unknown/read-back';
import type { From, Ledger } from './ledger';
import type { UnknownRecord } from './record-unknown';

const GUM = 'JCGM 100 (GUM)';

/** Lines from the measured solution to the result in the sample: dilution, budget, coverage, interval. */
export function recordBudget(ledger: Ledger, record: UnknownRecord, back: ReadBack, budget: Expanded): void {
  const { unit } = record.curve.request;
  recordFactor(ledger, record);
  ledger.line(
    {
      id: 'unknown.result',
      label: 'Concentration in the sample',
      symbol: 'C',
      unit,
      source: 'dilution undone',
    },
    'c * F',
    { c: 'unknown.measured', F: 'unknown.factor' },
    budget.value,
  );
  const termIds = budget.terms.map((term, i) => recordTerm(ledger, record, back, term, i));
  ledger.line(
    { id: 'unknown.u', label: 'Combined standard uncertainty', symbol: 'u(C)', unit, source: `${GUM}, 5.1` },
    `sqrt(${termIds.map((_, i) => `u_${i + 1}^2`).join(' + ')})`,
    Object.fromEntries(termIds.map((id, i) => [`u_${i + 1}`, id])),
    budget.u,
  );
  recordCoverage(ledger, record, budget, termIds);
}

function recordFactor(ledger: Ledger, { factor, unknown }: UnknownRecord): void {
  for (const volume of factor.volumes) {
    ledger.given(
      { id: volume.id, label: volume.label, symbol: volume.symbol, unit: 'mL', source: 'given' },
      volume.volumeMl,
    );
  }
  const text = {
    id: 'unknown.factor',
    label: 'Dilution factor',
    symbol: 'F',
    source: 'volumes made up to over volumes taken',
  };
  const steps = unknown.dilution ?? [];
  if (steps.length === 0) {
    ledger.given({ ...text, source: 'not diluted' }, factor.value);
    return;
  }
  const expression = steps.map((_, i) => `(V_to${i + 1} / V_taken${i + 1})`).join(' * ');
  ledger.line(
    text,
    expression,
    Object.fromEntries(factor.volumes.map((volume) => [volume.symbol, volume.id])),
    factor.value,
  );
}

/** One line of the budget; returns its id. */
function recordTerm(
  ledger: Ledger,
  { curve }: UnknownRecord,
  back: ReadBack,
  term: BudgetTerm,
  index: number,
): string {
  const id = `unknown.budget.${index + 1}`;
  const text = {
    id,
    label: `Budget: ${term.source}`,
    symbol: `u_${index + 1}`,
    unit: curve.request.unit,
    source: `${GUM}, 5.1`,
  };
  if (term.kind === 'curve' || term.kind === 'readings') {
    const part = `unknown.u.${term.kind}`;
    ledger.line(text, 'u * F', { u: part, F: 'unknown.factor' }, term.u);
  } else if (term.kind === 'blank') {
    ledger.solved(
      text,
      's / sqrt(p_b) through y0 and the slope',
      ['curve.s', 'curve.slope', 'unknown.result'],
      term.u,
    );
  } else {
    ledger.given(
      {
        id: `${id}.relative`,
        label: `Relative uncertainty: ${term.source}`,
        symbol: 'u_rel',
        source: 'given',
      },
      term.relative ?? 0,
    );
    const scale: From = { C: 'unknown.result', u_rel: `${id}.relative` };
    if (term.kind === 'path') {
      const slope = curve.fit.model === 'quadratic' ? 'unknown.slope' : 'curve.slope';
      ledger.line(
        text,
        'abs(y0 / b) * F * u_rel',
        { y0: 'unknown.mean', b: slope, F: 'unknown.factor', u_rel: `${id}.relative` },
        term.u,
      );
    } else ledger.line(text, 'abs(C) * u_rel', scale, term.u);
  }
  return id;
}

function recordCoverage(
  ledger: Ledger,
  { curve }: UnknownRecord,
  budget: Expanded,
  termIds: readonly string[],
): void {
  const { unit, confidence } = curve.request;
  const nu = Number.isFinite(budget.degreesOfFreedom) ? budget.degreesOfFreedom : 'infinite';
  ledger.solved(
    { id: 'unknown.nu', label: 'Effective degrees of freedom', symbol: 'nu_eff', source: `${GUM}, G.4` },
    'u(C)^4 / sum(u_i^4 / nu_i), the lines that share s as one',
    // With nothing but lines that share s, ν is the curve's, whatever their sizes.
    budget.terms.every((term) => term.sharesS)
      ? ['curve.degreesOfFreedom']
      : [...termIds, 'curve.degreesOfFreedom'],
    nu,
  );
  ledger.solved(
    {
      id: 'unknown.k',
      label: `Coverage factor for ${confidence * 100} %`,
      symbol: 'k',
      source: `${GUM}, G.3`,
    },
    't(1 - (1 - confidence) / 2; nu_eff)',
    ['unknown.nu'],
    budget.k,
  );
  ledger.line(
    { id: 'unknown.U', label: 'Expanded uncertainty', symbol: 'U', unit, source: `${GUM}, 6.2` },
    'k * u(C)',
    { k: 'unknown.k', 'u(C)': 'unknown.u' },
    budget.U,
  );
  const ends = { C: 'unknown.result', U: 'unknown.U' };
  const text = { unit, source: `${GUM}, 6.2` };
  ledger.line(
    { ...text, id: 'unknown.low', label: 'Interval, lower end', symbol: 'C_low' },
    'C - U',
    ends,
    budget.value - budget.U,
  );
  ledger.line(
    { ...text, id: 'unknown.high', label: 'Interval, upper end', symbol: 'C_high' },
    'C + U',
    ends,
    budget.value + budget.U,
  );
}
