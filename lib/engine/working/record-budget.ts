import type { BudgetTerm } from '../uncertainty/budget-term';
import type { Expanded } from '../uncertainty/combine';
import { type Scaling, scaleText } from '../unknown/scaling';
import type { Ledger } from './ledger';

const GUM = 'JCGM 100 (GUM)';

/** What the last lines of a result are made of, whatever it was measured by. */
export interface BudgetRecord {
  readonly unit: string;
  readonly confidence: number;
  readonly scaling: Scaling;
  readonly budget: Expanded;
  /** Ids that ν rests on when every line shares one estimate; else the lines themselves. */
  readonly nuFrom: readonly string[];
}

/** Lines from the measured solution to the result in the sample: dilution, recovery, budget, coverage, interval. */
export function recordBudget(ledger: Ledger, record: BudgetRecord): void {
  const { unit, scaling, budget } = record;
  recordScaling(ledger, scaling);
  ledger.line(
    {
      id: 'unknown.result',
      label: 'Concentration in the sample',
      symbol: 'C',
      unit,
      source: scaling.recovery ? 'dilution undone, divided by the recovery' : 'dilution undone',
    },
    scaleText('c', scaling),
    { c: 'unknown.measured', ...scaling.from },
    budget.value,
  );
  const termIds = budget.terms.map((term, i) => recordTerm(ledger, unit, term, i));
  ledger.line(
    { id: 'unknown.u', label: 'Combined standard uncertainty', symbol: 'u(C)', unit, source: `${GUM}, 5.1` },
    termIds.length === 0 ? '0' : `sqrt(${termIds.map((_, i) => `u_${i + 1}^2`).join(' + ')})`,
    Object.fromEntries(termIds.map((id, i) => [`u_${i + 1}`, id])),
    budget.u,
  );
  recordCoverage(ledger, record, termIds);
}

function recordScaling(ledger: Ledger, { factor, quantities }: Scaling): void {
  for (const { id, label, symbol, unit, source, value } of quantities) {
    ledger.given({ id, label, symbol, unit, source }, value);
  }
  const text = { id: 'unknown.factor', label: 'Dilution factor', symbol: 'F' };
  if (factor.quantities.length === 0) {
    ledger.given({ ...text, source: 'not diluted' }, factor.value);
    return;
  }
  const product = (power: number) => {
    const symbols = factor.quantities.filter((one) => one.power === power).map(({ symbol }) => symbol);
    return symbols.length === 1 ? symbols.join('') : `(${symbols.join(' * ')})`;
  };
  ledger.line(
    { ...text, source: 'made up to over taken' },
    `${product(1)} / ${product(-1)}`,
    Object.fromEntries(factor.quantities.map(({ symbol, id }) => [symbol, id])),
    factor.value,
  );
}

/** One line of the budget; returns its id. */
function recordTerm(ledger: Ledger, unit: string, term: BudgetTerm, index: number): string {
  const id = `unknown.budget.${index + 1}`;
  const text = {
    id,
    label: `Budget: ${term.source}`,
    symbol: `u_${index + 1}`,
    unit,
    source: `${GUM}, 5.1`,
  };
  const { working } = term;
  if ('how' in working) {
    ledger.solved(text, working.how, working.inputs, term.u);
    return id;
  }
  if (working.given) ledger.given(working.given.text, working.given.value);
  ledger.line(text, working.expression, working.from, term.u);
  return id;
}

function recordCoverage(ledger: Ledger, record: BudgetRecord, termIds: readonly string[]): void {
  const { unit, confidence, budget } = record;
  const nu = Number.isFinite(budget.degreesOfFreedom) ? budget.degreesOfFreedom : 'infinite';
  ledger.solved(
    { id: 'unknown.nu', label: 'Effective degrees of freedom', symbol: 'nu_eff', source: `${GUM}, G.4` },
    'u(C)^4 / sum(u_i^4 / nu_i), the lines that share s as one',
    // With nothing but lines that share s, ν is the curve's, whatever their sizes.
    budget.terms.every((term) => term.sharesS) ? record.nuFrom : [...termIds, ...record.nuFrom],
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
