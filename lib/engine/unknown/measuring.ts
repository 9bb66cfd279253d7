import type { Blanks } from '../blanks';
import type { CurveRequest } from '../types';

/** What reading an unknown needs to know of its method, be it a curve, a known absorptivity or a standard. */
export interface Measuring {
  readonly request: Pick<
    CurveRequest,
    'signal' | 'pathLengthMm' | 'unit' | 'absorbanceLimit' | 'confidence' | 'glassware'
  >;
  readonly blanks: Blanks;
  /** Concentrations that may be reported as numbers; `max` is Infinity where nothing bounds them. */
  readonly range: { readonly min: number; readonly max: number };
}
