/**
 * Spearman's rank correlation: the correlation of the ranks, ties sharing the mean of theirs; 0 when one of the lists
 * is all ties.
 *
 * @source Spearman (1904); checked with scipy
 */
export function rankCorrelation(a: readonly number[], b: readonly number[]): number {
  const [ra, rb] = [ranksOf(a), ranksOf(b)];
  const middle = (a.length + 1) / 2;
  let aa = 0;
  let ab = 0;
  let bb = 0;
  ra.forEach((rank, i) => {
    const [da, db] = [rank - middle, (rb[i] as number) - middle];
    aa += da * da;
    ab += da * db;
    bb += db * db;
  });
  return aa === 0 || bb === 0 ? 0 : ab / Math.sqrt(aa * bb);
}

function ranksOf(values: readonly number[]): number[] {
  const order = values.map((value, at) => ({ value, at })).sort((p, q) => p.value - q.value);
  const ranks = new Array<number>(values.length);
  for (let from = 0; from < order.length;) {
    let to = from;
    while (order[to + 1]?.value === order[from]?.value && to + 1 < order.length) to += 1;
    for (const { at } of order.slice(from, to + 1)) ranks[at] = (from + to) / 2 + 1;
    from = to + 1;
  }
  return ranks;
}
