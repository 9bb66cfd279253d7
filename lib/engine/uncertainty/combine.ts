import type { BudgetLine } from '../types';
import type { BudgetTerm } from './budget-term';
import { type Component, coverageFactor, effectiveDegreesOfFreedom } from './expand';

export interface Expanded {
  readonly terms: readonly BudgetTerm[];
  readonly lines: readonly BudgetLine[];
  readonly value: number;
  readonly u: number;
  readonly degreesOfFreedom: number;
  readonly k: number;
  readonly U: number;
}

/**
 * A value with the terms of its budget: u_c² = Σ (c_i u_i)², ν_eff, k = t(1 - (1 - confidence)/2; ν_eff), U = k u.
 * The lines that rest on one estimate s count as one component in ν_eff.
 *
 * @param whenCertain degrees of freedom to state when nothing has any uncertainty
 * @source JCGM 100:2008 (GUM), 5.1 and G.4
 */
export function combine(
  value: number,
  terms: readonly BudgetTerm[],
  confidence: number,
  whenCertain: number,
): Expanded {
  const u = Math.hypot(0, ...terms.map((term) => term.u));
  const degreesOfFreedom = effectiveDegreesOfFreedom(components(terms), whenCertain);
  const k = coverageFactor(confidence, degreesOfFreedom);
  const lines = terms.map((term): BudgetLine => ({
    source: term.source,
    u: term.u,
    share: u === 0 ? 0 : (term.u / u) ** 2,
    sensitivity: term.sensitivity,
    inputU: term.inputU,
    inputUnit: term.inputUnit,
    degreesOfFreedom: Number.isFinite(term.degreesOfFreedom) ? term.degreesOfFreedom : null,
    ...(term.sharesS ? { sharesS: true as const } : {}),
  }));
  return { terms, lines, value, u, degreesOfFreedom, k, U: k * u };
}

function components(terms: readonly BudgetTerm[]): readonly Component[] {
  const sharing = terms.filter((term) => term.sharesS);
  const [first] = sharing;
  const apart = terms.filter((term) => !term.sharesS);
  if (!first) return apart;
  const u = Math.hypot(...sharing.map((term) => term.u));
  return [{ u, degreesOfFreedom: first.degreesOfFreedom }, ...apart];
}
