import type { From, LineText } from '../working/ledger';
import { type ErrorSource, type Quantity, relativeSensitivity } from './quantity';
import type { Spread } from './spread';

/** How the working derives a line of the budget. */
export type TermWorking =
  /** From lines that are there, and from numbers given just for it. */
  | {
      readonly given?: { readonly text: LineText; readonly value: number };
      readonly expression: string;
      readonly from: From;
    }
  | { readonly how: string; readonly inputs: readonly string[] };

/** A line of a budget with everything its working and a Monte Carlo run need. */
export interface BudgetTerm {
  readonly source: string;
  /** Of the concentration in the sample. */
  readonly u: number;
  /** Standard uncertainty of the quantity behind it, in `inputUnit`. */
  readonly inputU: number;
  readonly inputUnit: string;
  /** ∂C/∂(that quantity), with its sign. */
  readonly sensitivity: number;
  readonly sharesS: boolean;
  readonly degreesOfFreedom: number;
  readonly working: TermWorking;
  /** For an error that multiplies the result or its reading, what is drawn. */
  readonly drawn?: {
    readonly of: 'result' | 'reading';
    readonly spreads: readonly Spread[];
    readonly moves: readonly Pick<Quantity, 'value' | 'power'>[];
  };
}

/** What a factor multiplies: the result C, or the reading on the scale of the result. */
export interface Scale {
  readonly of: 'result' | 'reading';
  readonly value: number;
  /** The scale in symbols of lines that are there: "C", or "(y0 / b) * F". */
  readonly expression: string;
  readonly from: From;
}

/** A Type B line from one source of error in factors: u = |scale · Σ power/x| · u(x). */
export function factorTerm(source: ErrorSource, scale: Scale, id: string): BudgetTerm {
  const sensitivity = scale.value * relativeSensitivity(source);
  return {
    source: source.label,
    u: Math.abs(sensitivity) * source.u,
    inputU: source.u,
    inputUnit: source.unit,
    sensitivity,
    sharesS: false,
    degreesOfFreedom: Infinity,
    working: {
      given: {
        text: {
          id: `${id}.input`,
          label: `Standard uncertainty: ${source.label}`,
          symbol: 'u_x',
          unit: source.unit,
          source: 'from what was given for it',
        },
        value: source.u,
      },
      expression: `abs(${scale.expression}) * ${movedBy(source)}u_x`,
      from: {
        ...scale.from,
        ...Object.fromEntries(
          source.moves.flatMap(({ symbol, id: line }) => (line === '' ? [] : [[symbol, line]])),
        ),
        u_x: `${id}.input`,
      },
    },
    drawn: { of: scale.of, spreads: source.spreads, moves: source.moves },
  };
}

function movedBy({ moves }: ErrorSource): string {
  if (moves.every((moved) => moved.id === '')) return '';
  const parts = moves.map(({ symbol, power }) => `${power === 1 ? '+' : '-'} 1 / ${symbol}`);
  if (moves.length === 1) return `1 / ${moves[0]?.symbol} * `;
  return `abs(${parts.join(' ').replace(/^\+ /, '')}) * `;
}
