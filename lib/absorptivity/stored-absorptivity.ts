import type {
  AbsorptivityKind,
  ConcentrationUnit,
  KnownAbsorptivityRequest,
  ReadingRule,
  Signal,
} from '@/lib/engine';

/** A known absorptivity as it is kept: the value, where it comes from, and how readings are taken by it. */
export interface StoredAbsorptivity {
  readonly analyte: string;
  /** What the concentration counts, such as Fe. */
  readonly basis: string;
  /** g/mol of the basis. */
  readonly formulaMass: number | null;
  readonly unit: ConcentrationUnit;
  readonly signal: Signal;
  readonly kind: AbsorptivityKind;
  readonly value: number;
  /** Standard uncertainty of the value; null when none was stated. */
  readonly u: number | null;
  readonly source: string;
  readonly conditions: string;
  readonly wavelengthNm: number;
  readonly readingRule: ReadingRule;
  readonly pathLengthMm: number;
  readonly pathLengthUMm: number | null;
  /** Standard deviation of one reading, known beforehand. */
  readonly readingSd: number | null;
  readonly confidence: number;
  readonly absorbanceLimit: number;
  readonly hazardNote: string;
}

/** What the calculation needs of it. */
export type CalculatedAbsorptivity = Omit<
  StoredAbsorptivity,
  'analyte' | 'basis' | 'wavelengthNm' | 'readingRule' | 'hazardNote'
>;

/** The request that the engine answers for a kept absorptivity, without unknowns. */
export function absorptivityRequest(stored: CalculatedAbsorptivity): KnownAbsorptivityRequest {
  const { kind, value, source, conditions } = stored;
  return {
    signal: stored.signal,
    pathLengthMm: stored.pathLengthMm,
    ...(stored.pathLengthUMm === null ? {} : { pathLengthUMm: stored.pathLengthUMm }),
    unit: stored.unit,
    ...(stored.formulaMass === null ? {} : { formulaMass: stored.formulaMass }),
    confidence: stored.confidence,
    absorbanceLimit: stored.absorbanceLimit,
    ...(stored.readingSd === null ? {} : { readingSd: stored.readingSd }),
    absorptivity: { kind, value, u: stored.u ?? 0, source, ...(conditions === '' ? {} : { conditions }) },
    unknowns: [],
  };
}
