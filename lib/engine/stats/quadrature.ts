/*
 * Gauss-Legendre quadrature, for the two distributions that no tested package offers (studentized range,
 * non-central t). Nodes are found by Newton's method on the Legendre polynomial, once.
 */

const ORDER = 16;

interface Rule {
  readonly nodes: readonly number[];
  readonly weights: readonly number[];
}

/** P_n(x) and its derivative by the three-term recurrence. */
function legendre(order: number, x: number): readonly [number, number] {
  let previous = 1;
  let current = x;
  for (let k = 2; k <= order; k += 1) {
    [previous, current] = [current, ((2 * k - 1) * x * current - (k - 1) * previous) / k];
  }
  return [current, (order * (x * current - previous)) / (x * x - 1)];
}

function makeRule(order: number): Rule {
  const nodes: number[] = [];
  const weights: number[] = [];
  for (let i = 0; i < order; i += 1) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (order + 0.5));
    for (let step = 0; step < 20; step += 1) {
      const [value, slope] = legendre(order, x);
      x -= value / slope;
      if (Math.abs(value / slope) < 1e-16) break;
    }
    const slope = legendre(order, x)[1];
    nodes.push(x);
    weights.push(2 / ((1 - x * x) * slope * slope));
  }
  return { nodes, weights };
}

const RULE = makeRule(ORDER);

export interface Mesh {
  readonly at: readonly number[];
  readonly weight: readonly number[];
}

/** Nodes and weights of the composite rule over panels between the given edges. */
export function meshOver(edges: readonly number[]): Mesh {
  const at: number[] = [];
  const weight: number[] = [];
  edges.slice(1).forEach((high, i) => {
    // The edge before: the list without its first is one behind.
    const low = edges[i] as number;
    RULE.nodes.forEach((node, k) => {
      at.push((low + high + (high - low) * node) / 2);
      weight.push(((RULE.weights[k] as number) * (high - low)) / 2);
    });
  });
  return { at, weight };
}

/** Σ weight·f(node). */
export function average(mesh: Mesh, f: (node: number) => number): number {
  return mesh.at.reduce((sum, node, i) => sum + (mesh.weight[i] as number) * f(node), 0);
}

/** x in [low, high] where f crosses zero (f(low) < 0 ≤ f(high)), by false position in the Illinois form. */
export function crossing(f: (x: number) => number, low: number, high: number): number {
  let [from, to] = [low, high];
  let [fromValue, toValue] = [f(low), f(high)];
  let kept = 0;
  for (let i = 0; i < 100 && to - from > 1e-11 * Math.max(1, to); i += 1) {
    const x = (from * toValue - to * fromValue) / (toValue - fromValue);
    const value = f(x);
    if (Math.abs(value) < 1e-13) return x;
    // The end that stays put twice counts half, so that both ends close in.
    if (value < 0) {
      [from, fromValue] = [x, value];
      if (kept === -1) toValue /= 2;
      kept = -1;
    } else {
      [to, toValue] = [x, value];
      if (kept === 1) fromValue /= 2;
      kept = 1;
    }
  }
  return (from + to) / 2;
}
