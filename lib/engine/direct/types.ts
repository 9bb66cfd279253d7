import type {
  BlankRequest,
  OwnedGlassware,
  Reading,
  SharedUncertainty,
  Signal,
  UnknownRequest,
  UnknownResult,
  ValueWithU,
} from '../types';
import type { Flag } from '../flags';
import type { ConcentrationUnit } from '../units';
import type { WorkingStep } from '../working/ledger';

/* Results without a curve of one's own: requests and answers, plain objects like those of a curve. */

/** What every way without a curve needs to know. */
export interface DirectRequest {
  readonly signal: Signal;
  readonly pathLengthMm: number;
  readonly pathLengthUMm?: number;
  readonly unit: ConcentrationUnit;
  readonly confidence: number;
  readonly absorbanceLimit: number;
  /** Blank readings are subtracted from every reading of the same path. */
  readonly blank?: Omit<BlankRequest, 'use'>;
  /** Standard deviation of one reading, in absorbance as read, when it is known beforehand. */
  readonly readingSd?: number;
  readonly recovery?: ValueWithU;
  readonly glassware?: OwnedGlassware;
  readonly unknowns: readonly Omit<UnknownRequest, 'weight'>[];
}

/** ε in L/(mol cm); E(1 %, 1 cm), of 1 g in 100 mL; or a in L/(g cm). */
export type AbsorptivityKind = 'molar' | 'percent' | 'specific';

export interface KnownAbsorptivityRequest extends DirectRequest {
  /** g/mol; needed between a molar absorptivity and a mass unit, or the other way round. */
  readonly formulaMass?: number;
  readonly absorptivity: {
    readonly kind: AbsorptivityKind;
    readonly value: number;
    readonly u: number;
    /** Where the value comes from. */
    readonly source: string;
    /** Wavelength, solvent, pH, temperature, bandwidth it holds for. */
    readonly conditions?: string;
  };
}

interface FromStandards extends DirectRequest {
  readonly standardsRelativeU?: number;
  readonly standardsShared?: readonly SharedUncertainty[];
}

export interface SingleStandardRequest extends FromStandards {
  readonly standard: {
    readonly concentration: number;
    readonly readings: readonly Reading[];
    /** Read again after the unknowns. */
    readonly readingsAfter?: readonly Reading[];
  };
  /** Largest change of the standard's mean between before and after, relative; default 0.02. */
  readonly driftLimit?: number;
}

export interface BracketingRequest extends FromStandards {
  readonly low: { readonly concentration: number; readonly readings: readonly Reading[] };
  readonly high: { readonly concentration: number; readonly readings: readonly Reading[] };
}

/** The same shape as an unknown of a curve; a critical value only where the scatter at zero is known. */
export interface DirectResult extends Omit<UnknownResult, 'criticalValue' | 'fieller'> {
  readonly criticalValue: number | null;
  readonly fieller: null;
}

export interface DirectAnswer {
  readonly engine: string;
  /** In words: what the concentrations rest on. */
  readonly basis: string;
  readonly flags: readonly Flag[];
  readonly working: readonly WorkingStep[];
  readonly unknowns: readonly DirectResult[];
}
