/** The two ends of a hash, enough to compare by eye: 9f2c…41ab. */
export function shortHash(hash: string): string {
  return `${hash.slice(0, 4)}\u2026${hash.slice(-4)}`;
}
