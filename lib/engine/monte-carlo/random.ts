/** Random numbers of one run: the same seed gives the same numbers on every machine. */
export interface Random {
  /** Uniform between 0 and 1, both left out. */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  /** χ² with ν degrees of freedom, ν above zero. */
  chiSquare(nu: number): number;
}

const TWO_TO_32 = 2 ** 32;

/**
 * xoshiro128** with its state filled by splitmix32. Our own lines, since the engine takes no dice from outside and
 * the loop must not allocate; both algorithms are public domain.
 *
 * @source Blackman and Vigna, Scrambled linear pseudorandom number generators, ACM Trans. Math. Softw. 47 (2021) 36
 */
function xoshiro128(seed: number): () => number {
  let mixed = seed >>> 0;
  const next = () => {
    mixed = (mixed + 0x9e3779b9) | 0;
    let z = mixed ^ (mixed >>> 16);
    z = Math.imul(z, 0x21f0aaad);
    z = Math.imul(z ^ (z >>> 15), 0x735a2d97);
    return z ^ (z >>> 15);
  };
  let [s0, s1, s2, s3] = [next(), next(), next(), next()];
  return () => {
    const product = Math.imul(s1, 5);
    const result = Math.imul((product << 7) | (product >>> 25), 9);
    const t = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = (s3 << 11) | (s3 >>> 21);
    return result >>> 0;
  };
}

/**
 * Normal numbers by the polar method, χ² as twice a gamma number of shape ν/2.
 *
 * @source Marsaglia and Bray, SIAM Rev. 6 (1964) 260; Marsaglia and Tsang, ACM Trans. Math. Softw. 26 (2000) 363
 */
export function randomOf(seed: number): Random {
  const bits = xoshiro128(seed);
  const uniform = () => (bits() + 0.5) / TWO_TO_32;
  let spare = NaN;
  const normal = () => {
    if (spare === spare) {
      const kept = spare;
      spare = NaN;
      return kept;
    }
    let x: number;
    let y: number;
    let r: number;
    do {
      x = 2 * uniform() - 1;
      y = 2 * uniform() - 1;
      r = x * x + y * y;
    } while (r >= 1);
    const scale = Math.sqrt((-2 * Math.log(r)) / r);
    spare = y * scale;
    return x * scale;
  };
  const gamma = (shape: number) => {
    const d = shape - 1 / 3;
    const c = 1 / Math.sqrt(9 * d);
    for (;;) {
      const x = normal();
      const v = (1 + c * x) ** 3;
      if (v > 0 && Math.log(uniform()) < 0.5 * x * x + d - d * v + d * Math.log(v)) return d * v;
    }
  };
  return {
    uniform,
    normal,
    // Below shape 1 the number of shape + 1 is brought down by a power of a uniform one.
    chiSquare: (nu) => (nu >= 2 ? 2 * gamma(nu / 2) : 2 * gamma(nu / 2 + 1) * uniform() ** (2 / nu)),
  };
}
