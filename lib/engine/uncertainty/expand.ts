import { tQuantile } from '../stats/student-t';

/** One independent component of a combined uncertainty; ν = Infinity for Type B. */
export interface Component {
  readonly u: number;
  readonly degreesOfFreedom: number;
}

/**
 * Effective degrees of freedom, not rounded: ν_eff = u_c⁴ / Σ(u_i⁴/ν_i). Lines that rest on one and the same
 * estimate must come in as one component.
 *
 * @source JCGM 100:2008 (GUM), G.4, Welch-Satterthwaite
 */
export function effectiveDegreesOfFreedom(components: readonly Component[], whenCertain: number): number {
  const combined = components.reduce((sum, part) => sum + part.u ** 2, 0);
  if (combined === 0) return whenCertain;
  // In shares of the variance, since u⁴ would underflow for small units.
  const spent = components.reduce(
    (sum, part) => sum + (part.u ** 2 / combined) ** 2 / part.degreesOfFreedom,
    0,
  );
  return spent === 0 ? Infinity : 1 / spent;
}

/** k = t(1 - (1 - confidence)/2; ν_eff). */
export function coverageFactor(confidence: number, degreesOfFreedom: number): number {
  return tQuantile(1 - (1 - confidence) / 2, degreesOfFreedom);
}
