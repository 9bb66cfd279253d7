import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { average, crossing, meshOver, type Mesh } from './quadrature';
import { scaledChiMesh } from './scaled-chi';
import { tQuantile } from './student-t';

/** Nodes over the normal density, with its density and distribution at each. */
const Z = meshOver([-7, -4, -1.5, 1, 3.5, 7]);
const PHI = Z.at.map((z, i) => ((Z.weight[i] as number) * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI));
const CDF = Z.at.map((z) => normalCdf(z, 0, 1));

/** P(range of `count` standard normal values < w) = p ∫ φ(z) [Φ(z) - Φ(z - w)]^(p-1) dz. */
function rangeCdf(w: number, count: number): number {
  let sum = 0;
  for (let i = 0; i < Z.at.length; i += 1) {
    const span = (CDF[i] as number) - normalCdf((Z.at[i] as number) - w, 0, 1);
    sum += (PHI[i] as number) * span ** (count - 1);
  }
  return count * sum;
}

/** P(range / s < q) for `count` values whose standard deviation is estimated with ν degrees of freedom. */
export function studentizedRangeCdf(q: number, count: number, nu: number): number {
  return averageOver(scaledChiMesh(nu), q, count);
}

function averageOver(mesh: Mesh, q: number, count: number): number {
  return average(mesh, (s) => rangeCdf(q * s, count));
}

const known = new Map<string, number>();

/**
 * Quantile q(probability; count, ν) of the studentized range. Own quadrature, since no tested package offers
 * it; for two values it is exactly √2·t. Kept once found: a curve asks for the same one again and again.
 *
 * @source definition: Newman, Biometrika 31 (1939) 20; checked against the tables of Harter (1960)
 */
export function studentizedRangeQuantile(probability: number, count: number, nu: number): number {
  if (count === 2) return Math.SQRT2 * tQuantile((1 + probability) / 2, nu);
  const key = `${probability}/${count}/${nu}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const mesh = scaledChiMesh(nu);
  let high = 8;
  while (averageOver(mesh, high, count) < probability) high *= 2;
  const q = crossing((value) => averageOver(mesh, value, count) - probability, 0, high);
  known.set(key, q);
  return q;
}
