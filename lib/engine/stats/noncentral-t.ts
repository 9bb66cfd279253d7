import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { average, crossing } from './quadrature';
import { scaledChiMesh } from './scaled-chi';
import { tQuantile } from './student-t';

/** P(T' ≤ t) of the non-central t: the mean of Φ(t·s - δ) over s = χ_ν/√ν. */
export function noncentralTCdf(t: number, nu: number, delta: number): number {
  const mesh = scaledChiMesh(nu);
  return average(mesh, (s) => normalCdf(t * s - delta, 0, 1));
}

const known = new Map<string, number>();

/**
 * δ(ν; α, β): the non-centrality at which a value passes the critical t(1 - α; ν) with probability 1 - β.
 *
 * @source ISO 11843-1, in our own words; checked against its table for α = β = 0.05
 */
export function detectionDelta(nu: number, alpha: number, beta: number): number {
  const key = `${nu}/${alpha}/${beta}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const critical = tQuantile(1 - alpha, nu);
  let high = 2 * critical;
  while (noncentralTCdf(critical, nu, high) > beta) high *= 1.5;
  const delta = crossing((value) => beta - noncentralTCdf(critical, nu, value), 0, high);
  known.set(key, delta);
  return delta;
}
