import { checkDilution } from '../checks/check-unknown';
import { requireNotNegative, requirePositive } from '../checks/require';
import { EngineError } from '../errors';
import type { AnyDilutionStep, SharedUncertainty } from '../types';
import { errorSources, productOf, type Quantity } from '../uncertainty/quantity';
import { dilutionFactor } from '../unknown/dilution-factor';

/** Where a solution of a series was taken from when it was the stock. */
export const STOCK = 'stock';

export interface SeriesSolution {
  readonly name: string;
  /** "stock", or the name of a solution before it. */
  readonly from: string;
  readonly dilution: readonly AnyDilutionStep[];
  /** False for an intermediate that is no standard itself. Default true. */
  readonly isStandard?: boolean;
}

export interface SeriesRequest {
  readonly stock: { readonly concentration: number; readonly relativeU: number };
  readonly solutions: readonly SeriesSolution[];
}

export interface PreparedStandard {
  readonly name: string;
  readonly concentration: number;
  readonly u: number;
  /** The part of u/c that it does not share with all standards. */
  readonly ownRelativeU: number;
}

export interface PreparedSeries {
  readonly standards: readonly PreparedStandard[];
  /** Of the concentrations, in the order of `standards`. */
  readonly covariance: readonly (readonly number[])[];
  readonly correlation: readonly (readonly number[])[];
  /** Errors that move every standard in the same proportion: lines for the budget of a result, counted once. */
  readonly shared: readonly SharedUncertainty[];
  /** All of them together. */
  readonly sharedRelativeU: number;
}

/** Sensitivities closer than this are the same one. */
const SAME = 1e-12;

/**
 * Standards made from one stock, directly or from one another, with their uncertainties and correlations:
 *
 *     c_k = c_stock / F_k        cov(c_k, c_l) = c_k c_l Σ_j r_kj r_lj u_j²
 *
 * summed over independent errors j (stock, each filling, the tolerance of each named piece), r_kj the relative
 * sensitivity of c_k to error j. A solution made from another inherits its errors. What moves all standards alike is
 * told apart, since on a curve it is no scatter but a common factor.
 *
 * @throws EngineError SERIES_BROKEN for a solution made from one that does not stand before it, and those of a dilution
 * @source JCGM 100:2008 (GUM), 5.2 and F.1.2.3; EURACHEM/CITAC Guide CG 4, E.3
 */
export function prepareSeries({ stock, solutions }: SeriesRequest): PreparedSeries {
  requirePositive(
    stock.concentration,
    'CONCENTRATION_NEGATIVE',
    'the concentration of the stock',
    '/stock/concentration',
  );
  requireNotNegative(stock.relativeU, 'the relative uncertainty of the stock', '/stock/relativeU');
  const lines = lineages(solutions);
  const made = solutions
    .filter((solution) => solution.isStandard !== false)
    .map(({ name }) => ({ name, line: lines.get(name) as readonly Quantity[] }));
  const everything = [...new Map([...lines.values()].flat().map((item) => [item.id, item])).values()];
  const errors = [
    { source: STOCK, u: stock.relativeU, r: made.map(() => 1) },
    ...errorSources(everything).map(({ label, u, moves }) => ({
      source: label,
      u,
      r: made.map(({ line }) =>
        // Diluting divides: the factor's power turns round.
        line.reduce((sum, item) => (moves.includes(item) ? sum - item.power / item.value : sum), 0),
      ),
    })),
  ].filter((error) => error.u > 0);
  const isShared = ({ r }: { readonly r: readonly number[] }) => {
    const [first = 0] = r;
    return first !== 0 && r.every((value) => Math.abs(value - first) <= SAME * Math.abs(first));
  };
  const own = errors.filter((error) => !isShared(error));
  const shared = errors
    .filter(isShared)
    .map(({ source, u, r }) => ({ source, relativeU: u * Math.abs(r[0] as number) }));
  const c = made.map(({ line }) => stock.concentration / productOf(line));
  const covariance = c.map((ck, k) =>
    c.map(
      (cl, l) =>
        ck * cl * errors.reduce((sum, { u, r }) => sum + (r[k] as number) * (r[l] as number) * u * u, 0),
    ),
  );
  const sd = covariance.map((row, k) => Math.sqrt(row[k] as number));
  return {
    standards: made.map(({ name }, k) => ({
      name,
      concentration: c[k] as number,
      u: sd[k] as number,
      ownRelativeU: Math.hypot(0, ...own.map(({ u, r }) => u * (r[k] as number))),
    })),
    covariance,
    // A standard without any uncertainty is correlated with none.
    correlation: covariance.map((row, k) =>
      row.map((value, l) =>
        k === l ? 1 : value === 0 ? 0 : value / ((sd[k] as number) * (sd[l] as number)),
      ),
    ),
    shared,
    sharedRelativeU: Math.hypot(0, ...shared.map((item) => item.relativeU)),
  };
}

/** Every quantity between the stock and each solution; those inherited are the very same objects. */
function lineages(solutions: readonly SeriesSolution[]): ReadonlyMap<string, readonly Quantity[]> {
  const lines = new Map<string, readonly Quantity[]>([[STOCK, []]]);
  solutions.forEach(({ name, from, dilution }, i) => {
    const before = lines.get(from);
    if (!before || lines.has(name)) {
      throw new EngineError(
        'SERIES_BROKEN',
        `every solution needs a name of its own and one before it to be made from; "${name}" is made from "${from}"`,
        `/solutions/${i}/from`,
      );
    }
    checkDilution(dilution, `/solutions/${i}/dilution`);
    const own = dilutionFactor(dilution).quantities.map((item) => ({
      ...item,
      id: `${name}/${item.id}`,
      label: `${name}: ${item.label}`,
    }));
    lines.set(name, [...before, ...own]);
  });
  lines.delete(STOCK);
  return lines;
}
