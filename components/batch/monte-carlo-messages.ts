import type { CurveRequest } from '@/lib/engine';
import type { MonteCarloAnswer, MonteCarloOptions } from '@/lib/engine/monte-carlo/simulate-result';

/** What the worker is asked: the curve with this one unknown. */
export interface MonteCarloAsked {
  readonly request: CurveRequest;
  readonly options: MonteCarloOptions;
}

export interface MonteCarloAnswered {
  /** Null when the unknown has no concentration to draw about. */
  readonly answer: MonteCarloAnswer | null;
  readonly error: string | null;
}
