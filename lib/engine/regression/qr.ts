/*
 * Householder's orthogonal decomposition. mathjs has one too, which builds all of Q, n by n, and is slower by the
 * ratio that math.ts and `npm run bench` say; the tests ask it for its opinion.
 */

/** The decomposition of an n × q matrix, n ≥ q, of full rank. */
export interface Qr {
  /** Upper triangle R, q × q. */
  readonly r: readonly (readonly number[])[];
  /** Reflection vectors, one per column, in the order they are applied. */
  readonly reflections: readonly (readonly number[])[];
}

/** v - 2 u (uᵀv)/(uᵀu), from row `from` on. */
function reflect(v: number[], u: readonly number[], from: number): void {
  let uv = 0;
  let uu = 0;
  for (let i = from; i < v.length; i += 1) {
    const ui = u[i] as number;
    uv += ui * (v[i] as number);
    uu += ui * ui;
  }
  const factor = uu === 0 ? 0 : (2 * uv) / uu;
  for (let i = from; i < v.length; i += 1) v[i] = (v[i] as number) - factor * (u[i] as number);
}

/** Length of v from row `from` on. */
function lengthFrom(v: readonly number[], from: number): number {
  let sum = 0;
  for (let i = from; i < v.length; i += 1) sum += (v[i] as number) ** 2;
  return Math.sqrt(sum);
}

/** @param matrix its columns */
export function householder(matrix: readonly (readonly number[])[]): Qr {
  const columns = matrix.map((column) => [...column]);
  const reflections = columns.map((column, j) => {
    const u = [...column];
    const head = column[j] as number;
    const length = lengthFrom(column, j);
    u[j] = head + (head >= 0 ? length : -length);
    for (let k = j; k < columns.length; k += 1) reflect(columns[k] as number[], u, j);
    return u;
  });
  const r = columns.map((_, i) => columns.map((column, j) => (j < i ? 0 : (column[i] as number))));
  return { r, reflections };
}

function backSubstitute(r: Qr['r'], right: readonly number[]): number[] {
  const q = r.length;
  const solution = new Array<number>(q).fill(0);
  for (let i = q - 1; i >= 0; i -= 1) {
    const row = r[i] as readonly number[];
    let rest = right[i] as number;
    for (let j = i + 1; j < q; j += 1) rest -= (row[j] as number) * (solution[j] as number);
    solution[i] = rest / (row[i] as number);
  }
  return solution;
}

/** The β that makes |y - Xβ| least, X being what was factorised. */
export function leastSquares(qr: Qr, y: readonly number[]): number[] {
  const rotated = [...y];
  qr.reflections.forEach((u, j) => reflect(rotated, u, j));
  return backSubstitute(qr.r, rotated);
}

/** (RᵀR)⁻¹ = (XᵀX)⁻¹. */
export function inverseOfRtR({ r }: Qr): number[][] {
  // Row k of the result of solving R z = e_k is column k of R⁻¹.
  const columns = r.map((_, k) =>
    backSubstitute(
      r,
      r.map((_row, i) => (i === k ? 1 : 0)),
    ),
  );
  return r.map((_, i) =>
    r.map((_row, j) =>
      columns.reduce((sum, column) => sum + (column[i] as number) * (column[j] as number), 0),
    ),
  );
}
