import { type Spread, spreadU } from './spread';

/** A quantity that a result is multiplied by, to a power: a volume, a mass, a recovery, an absorptivity. */
export interface Quantity {
  /** Id of its line in the working; empty for a pure factor of 1, which needs none. */
  readonly id: string;
  readonly label: string;
  readonly symbol: string;
  readonly unit: string;
  readonly value: number;
  readonly power: 1 | -1;
  /** Errors of this one use. */
  readonly spreads: readonly Spread[];
  /** Where the value came from. */
  readonly source: string;
  /** An error that every use of one named piece has in common. */
  readonly shared?: { readonly piece: string; readonly spreads: readonly Spread[] };
}

/** One source of error: its spread, and the quantities it moves. */
export interface ErrorSource {
  readonly label: string;
  readonly unit: string;
  readonly spreads: readonly Spread[];
  /** Standard uncertainty of the error, in `unit`. */
  readonly u: number;
  readonly moves: readonly Quantity[];
}

/** Π x^power. */
export function productOf(quantities: readonly Quantity[]): number {
  return quantities.reduce(
    (product, { value, power }) => (power === 1 ? product * value : product / value),
    1,
  );
}

/**
 * The independent errors behind some quantities. An error of one named piece (the tolerance of a pipette used twice)
 * is one source that moves every quantity the piece measured; everything else is a source by itself.
 */
export function errorSources(quantities: readonly Quantity[]): readonly ErrorSource[] {
  const own = quantities.map((quantity) => sourceOf(quantity.label, quantity.spreads, [quantity]));
  const pieces = new Map(
    quantities.flatMap(({ shared }) => (shared ? [[shared.piece, shared.spreads]] : [])),
  );
  const common = [...pieces].map(([piece, spreads]) => {
    const moves = quantities.filter(({ shared }) => shared?.piece === piece);
    const times = moves.length === 1 ? 'used once' : `used ${moves.length} times`;
    return sourceOf(`${piece}, ${times}`, spreads, moves);
  });
  return [...own, ...common].filter((source) => source.u > 0);
}

function sourceOf(label: string, spreads: readonly Spread[], moves: readonly Quantity[]): ErrorSource {
  const [{ unit }] = moves as [Quantity];
  return { label, unit, spreads, u: Math.hypot(0, ...spreads.map(spreadU)), moves };
}

/** Relative sensitivity of the product to a source, per unit of its error: Σ power/x, with signs. */
export function relativeSensitivity({ moves }: ErrorSource): number {
  return moves.reduce((sum, { value, power }) => sum + power / value, 0);
}

/**
 * Relative standard uncertainty of a product of powers, (u_P/P)² = Σ (Σ power/x)² u²: first order, exact for one
 * factor above and one below.
 *
 * @source JCGM 100:2008 (GUM), 5.1.6; EURACHEM/CITAC Guide CG 4, examples A1 and A2
 */
export function relativeU(quantities: readonly Quantity[]): number {
  return Math.hypot(0, ...errorSources(quantities).map((source) => relativeSensitivity(source) * source.u));
}
