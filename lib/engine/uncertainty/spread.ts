/**
 * How the error of one quantity is spread about zero. One declaration serves the budget, which needs its standard
 * uncertainty, and the Monte Carlo run, which draws from it.
 */
export type Spread =
  | { readonly shape: 'normal'; readonly u: number }
  | { readonly shape: 'rectangular'; readonly halfWidth: number }
  | { readonly shape: 'triangular'; readonly halfWidth: number }
  /** Scaled t: u estimated from repeats with so many degrees of freedom. */
  | { readonly shape: 't'; readonly u: number; readonly degreesOfFreedom: number };

/**
 * Standard uncertainty of a spread: a/√3 rectangular, a/√6 triangular, u as given otherwise. For t it is the
 * estimate s/√n that the budget works with, not the larger standard deviation of the t distribution itself.
 *
 * @source JCGM 100:2008 (GUM), 4.3; EURACHEM/CITAC Guide CG 4, appendix E.1
 */
export function spreadU(spread: Spread): number {
  switch (spread.shape) {
    case 'rectangular':
      return spread.halfWidth / Math.sqrt(3);
    case 'triangular':
      return spread.halfWidth / Math.sqrt(6);
    case 'normal':
    case 't':
      return spread.u;
  }
}
