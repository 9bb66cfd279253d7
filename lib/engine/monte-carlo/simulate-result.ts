import type { BudgetTerm } from '../uncertainty/budget-term';
import type { Expanded } from '../uncertainty/combine';
import { type Agreement, agreementOf } from './agreement';
import type { Core } from './curve-core';
import { drawAll } from './draw';
import type { Random } from './random';
import { type Simulated, simulate } from './simulate';

export interface MonteCarloOptions {
  readonly trials: number;
  readonly seed: number;
}

export interface MonteCarloAnswer extends Simulated {
  readonly seed: number;
  readonly unit: string;
  readonly agreement: Agreement;
}

/**
 * The Monte Carlo run beside a budget: the core drawn, every factor drawn from what was declared of it
 * (triangular, rectangular, normal), and the interval of the trials held against C ± U.
 *
 * @param core  draws c in the measured solution
 * @param scale from c to the sample, F/R at their estimates
 */
export function simulateResult(
  core: Core,
  scale: number,
  budget: Expanded,
  facts: { readonly unit: string; readonly confidence: number },
  { trials, seed }: MonteCarloOptions,
): MonteCarloAnswer {
  const ofResult = factorsOf(budget.terms, 'result');
  const ofReading = factorsOf(budget.terms, 'reading');
  const run = simulate({
    trial: (random) => core(random, drawFactors(ofReading, random)) * scale * drawFactors(ofResult, random),
    trials,
    seed,
    confidence: facts.confidence,
  });
  const { value, u, U } = budget;
  return { ...run, seed, unit: facts.unit, agreement: agreementOf({ value, u, U, unit: facts.unit }, run) };
}

type Drawn = NonNullable<BudgetTerm['drawn']>;

function factorsOf(terms: readonly BudgetTerm[], of: Drawn['of']): readonly Drawn[] {
  return terms.flatMap(({ drawn }) => (drawn?.of === of ? [drawn] : []));
}

/** Π ((x + e)/x)^power, one e for everything a source moves. */
function drawFactors(factors: readonly Drawn[], random: Random): number {
  let product = 1;
  for (const { spreads, moves } of factors) {
    const error = drawAll(spreads, random);
    for (const { value, power } of moves) {
      const ratio = (value + error) / value;
      product = power === 1 ? product * ratio : product / ratio;
    }
  }
  return product;
}
