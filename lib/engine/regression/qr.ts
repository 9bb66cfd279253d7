/** A Householder factorisation of an n × q matrix, n ≥ q, of full rank. */
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
    uv += (u[i] ?? 0) * (v[i] ?? 0);
    uu += (u[i] ?? 0) ** 2;
  }
  const factor = uu === 0 ? 0 : (2 * uv) / uu;
  for (let i = from; i < v.length; i += 1) v[i] = (v[i] ?? 0) - factor * (u[i] ?? 0);
}

export function householder(rows: readonly (readonly number[])[]): Qr {
  const q = rows[0]?.length ?? 0;
  const columns = Array.from({ length: q }, (_, j) => rows.map((row) => row[j] ?? 0));
  const reflections: number[][] = [];
  for (let j = 0; j < q; j += 1) {
    const column = columns[j] ?? [];
    const length = Math.hypot(...column.slice(j));
    const u = column.map((value, i) => (i < j ? 0 : value));
    u[j] = (u[j] ?? 0) + ((column[j] ?? 0) >= 0 ? length : -length);
    for (const other of columns.slice(j)) reflect(other, u, j);
    reflections.push(u);
  }
  const r = Array.from({ length: q }, (_, i) => columns.map((column, j) => (j < i ? 0 : (column[i] ?? 0))));
  return { r, reflections };
}

function backSubstitute(r: Qr['r'], right: readonly number[]): number[] {
  const q = r.length;
  const solution = new Array<number>(q).fill(0);
  for (let i = q - 1; i >= 0; i -= 1) {
    let rest = right[i] ?? 0;
    for (let j = i + 1; j < q; j += 1) rest -= (r[i]?.[j] ?? 0) * (solution[j] ?? 0);
    solution[i] = rest / (r[i]?.[i] ?? NaN);
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
  const q = r.length;
  // Row k of the result of solving R z = e_k is column k of R⁻¹.
  const columns = Array.from({ length: q }, (_, k) =>
    backSubstitute(
      r,
      Array.from({ length: q }, (_unused, i) => (i === k ? 1 : 0)),
    ),
  );
  return Array.from({ length: q }, (_, i) =>
    Array.from({ length: q }, (_unused, j) =>
      columns.reduce((sum, column) => sum + (column[i] ?? 0) * (column[j] ?? 0), 0),
    ),
  );
}
