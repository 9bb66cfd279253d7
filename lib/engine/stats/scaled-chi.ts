import { meshOver, type Mesh } from './quadrature';

/**
 * Mesh for averages over s = χ_ν / √ν, the ratio of an estimated to a true standard deviation:
 * Σ weight·g(s) = E[g(s)]. The density, proportional to s^(ν-1)·exp(-ν s²/2), is normalised on the mesh itself.
 * Panels are narrow near zero, where few degrees of freedom put heavy tails of ratios like range/s.
 */
export function scaledChiMesh(nu: number): Mesh {
  const reach = 9 / Math.sqrt(nu);
  const low = Math.max(0, 1 - reach);
  const high = 1 + reach;
  const edges = [low];
  const few = nu < 4;
  if (few) edges.push(0.01, 0.03, 0.08, 0.15, 0.3, 0.5, 0.75);
  // There is one edge at least.
  const start = edges.at(-1) as number;
  const panels = few ? 8 : 4;
  for (let i = 1; i <= panels; i += 1) edges.push(start + ((high - start) * i) / panels);
  const raw = meshOver(edges);
  const density = raw.at.map((s, i) => {
    const log = (nu - 1) * Math.log(s) - (nu * (s * s - 1)) / 2;
    return (raw.weight[i] as number) * Math.exp(log);
  });
  const total = density.reduce((sum, value) => sum + value, 0);
  return { at: raw.at, weight: density.map((value) => value / total) };
}
