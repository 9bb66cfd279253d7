export interface Measured {
  readonly name: string;
  readonly medianMs: number;
}

/** Median of several timed runs after a warm-up, in milliseconds a run. */
export function measure(name: string, work: () => unknown, { runs = 15, warmUp = 3 } = {}): Measured {
  for (let k = 0; k < warmUp; k += 1) work();
  const times = Array.from({ length: runs }, () => {
    const start = performance.now();
    work();
    return performance.now() - start;
  });
  return { name, medianMs: medianOf(times) };
}

/** Two works timed in turn, so that a busy machine slows both alike: for ratios of short ones. */
export function measureInTurn(
  works: readonly (readonly [string, () => unknown])[],
  runs = 2000,
): readonly Measured[] {
  const times = works.map(() => [] as number[]);
  for (let k = 0; k < runs; k += 1) {
    works.forEach(([, work], i) => {
      const start = performance.now();
      work();
      times[i]?.push(performance.now() - start);
    });
  }
  return works.map(([name], i) => ({ name, medianMs: medianOf(times[i] ?? []) }));
}

function medianOf(times: readonly number[]): number {
  return [...times].sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? NaN;
}

/** Print a figure beside the reference loop of the same run: the ratio is what travels between machines. */
export function report(measured: Measured, reference: Measured): void {
  const ratio = measured.medianMs / reference.medianMs;
  const left = measured.name.padEnd(62);
  console.info(
    `${left} ${measured.medianMs.toFixed(3).padStart(10)} ms   ${ratio.toFixed(2).padStart(9)} x ${reference.name}`,
  );
}
