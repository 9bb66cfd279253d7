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
  }).sort((a, b) => a - b);
  return { name, medianMs: times[Math.floor(times.length / 2)] ?? NaN };
}

/** Print a figure beside the reference loop of the same run: the ratio is what travels between machines. */
export function report(measured: Measured, reference: Measured): void {
  const ratio = measured.medianMs / reference.medianMs;
  const left = measured.name.padEnd(62);
  console.info(
    `${left} ${measured.medianMs.toFixed(3).padStart(10)} ms   ${ratio.toFixed(2).padStart(9)} x ${reference.name}`,
  );
}
