import type { z } from 'zod';
import { calculateStandardCurve, EngineError, type CurveAnswer, type CurveRequest } from '@/lib/engine';
import { standardDrafts, type StandardDraftInput } from '@/lib/schemas/curve';
import { calculationFields } from '@/lib/schemas/method';
import { spectrumRule, type RuleTexts } from '@/lib/schemas/spectrum-rule';
import { curveRequest } from './curve-request';
import type { StoredStandard } from './stored-curve';
import { storedStandards, type ReadSpectra } from './stored-standards';

export type CalculationTexts = z.input<typeof calculationFields>;

export interface LiveInput {
  readonly calculation: CalculationTexts;
  readonly rule: RuleTexts;
  readonly standards: readonly StandardDraftInput[];
  readonly spectra: ReadSpectra;
}

/**
 * What the page shows while a curve is typed. `standards` are those that could be read, `places` say where
 * each of them stands among the standards of the draft; without an answer, `sentence` says what is missing.
 */
export interface LiveCurve {
  readonly standards: readonly StoredStandard[];
  readonly places: readonly number[];
  readonly answer: CurveAnswer | null;
  /** What the answer was asked with; null without one. */
  readonly request: CurveRequest | null;
  readonly sentence: string;
  /** The engine's refusal of these readings, as opposed to a form that is not complete. */
  readonly refused: boolean;
}

const nothing = (sentence: string): LiveCurve => ({
  standards: [],
  places: [],
  answer: null,
  request: null,
  sentence,
  refused: false,
});

/** A row that is still being typed takes no part yet. */
const isComplete = (standard: StandardDraftInput) =>
  standard.readings.length > 0 && (standard.role === 'blank' || standard.concentration.trim() !== '');

/** Calculate from what is typed so far. Never throws on what a person may type. */
export function liveCurve({ calculation, rule, standards, spectra }: LiveInput): LiveCurve {
  const fields = calculationFields.safeParse(calculation);
  if (!fields.success) return nothing(fields.error.issues[0]?.message ?? 'Some entries need another look');
  const places = standards.flatMap((standard, index) => (isComplete(standard) ? [index] : []));
  if (places.length === 0) return nothing('Enter standards with their readings: the line appears here');
  const drafts = standardDrafts.safeParse(standards.filter(isComplete));
  if (!drafts.success) return nothing(drafts.error.issues[0]?.message ?? 'A standard needs another look');
  const { signal, pathLengthMm } = fields.data;
  const read = storedStandards(drafts.data, {
    signal,
    pathLengthMm,
    rule: spectrumRule.safeParse(rule).data ?? null,
    spectra,
  });
  if (read.refusals[0]) return nothing(read.refusals[0].message);
  const kept = { standards: read.standards, places };
  try {
    const request = curveRequest(fields.data, read.standards);
    return { ...kept, answer: calculateStandardCurve(request), request, sentence: '', refused: false };
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    return { ...kept, answer: null, request: null, sentence: refusalWords(error), refused: true };
  }
}

const WHAT_TO_DO: Readonly<Record<string, string>> = {
  NO_STANDARDS: 'Enter standards with their readings: the line appears here',
  TOO_FEW_STANDARDS:
    'A line with an intercept of its own needs three different concentrations; one through zero needs two. Add a standard',
  STANDARDS_COINCIDE: 'All standards have the same concentration. A line needs different ones',
  ZERO_SLOPE: 'The readings do not change with the concentration, so nothing can be read off this line',
  BLANK_CENSORED:
    'A blank reading has no number. Leave that reading out with a reason, or read the blank again',
  BLANK_LEVEL_THROUGH_ZERO:
    'A line through zero takes no blank level. Subtract the blank, or leave the intercept free',
  BLANK_PATH_MISSING: 'The blank rule needs blank readings: write "blank" as the concentration of a row',
  FORMULA_MASS_MISSING: 'This unit counts particles: enter the formula mass of what is counted',
};

/** What a person does about a refusal of the engine; the engine's own words where we have none. */
export function refusalWords(error: EngineError): string {
  if (error.code === 'NO_READINGS' && error.pointer?.startsWith('/blank'))
    return 'The blank rule needs blank readings: write "blank" as the concentration of a row';
  const own = error.message.charAt(0).toUpperCase() + error.message.slice(1);
  return WHAT_TO_DO[error.code] ?? own;
}
