import { significantText } from '../../format/round';
import { type Flag, flag } from '../flags';
import { mean, std } from '../math';
import { tQuantile } from '../stats/student-t';
import type { LimitAnswer } from '../types';

/** One spiked sample or method blank, through the whole method; null when it gave no number. */
export interface StudySample {
  readonly value: number | null;
  readonly batch?: string;
  /** Of the preparation, however dates are written here. */
  readonly date?: string;
}

export interface MdlStudy {
  /** Concentration that the spikes were made to. */
  readonly spikeLevel?: number;
  readonly spikes: readonly StudySample[];
  readonly blanks: readonly StudySample[];
}

export interface MdlAnswer {
  readonly limits: readonly LimitAnswer[];
  readonly notMade: readonly { readonly name: string; readonly reason: string }[];
  readonly flags: readonly Flag[];
}

/** Spikes, and blanks, that the rule asks for; preparation batches, and dates, that they are spread over. */
const LEAST = 7;
const SPREAD_OVER = 3;
const CONFIDENCE = 0.99;
const NAME = '40 CFR 136 method detection limit';
const SOURCE = '40 CFR 136, appendix B, revision 2';

/**
 * Method detection limit, the larger of
 *
 *     MDL_S = t(0.99; n - 1) S_s        MDL_b = max(0, x̄_b) + t(0.99; n_b - 1) S_b
 *
 * from at least seven spikes and seven blanks, results of the whole method. Where some blanks gave no number MDL_b
 * is the highest blank; where none did it does not apply.
 *
 * @param unit of the results, for the flags
 * @source 40 CFR 136, appendix B, revision 2, in our own words
 */
export function methodDetectionLimit(study: MdlStudy, unit: string): MdlAnswer {
  const ofSpikes = fromSpikes(study.spikes);
  if (typeof ofSpikes === 'string')
    return { limits: [], notMade: [{ name: NAME, reason: ofSpikes }], flags: [] };
  const ofBlanks = fromBlanks(study.blanks);
  const blankValue = typeof ofBlanks === 'string' ? null : ofBlanks.value;
  const value = Math.max(ofSpikes.value, blankValue ?? -Infinity);
  const limits = [
    limit(`${NAME} from spikes (MDL_S)`, ofSpikes.value, ofSpikes.basis, 't(0.99; n - 1) * S_s'),
    ...(typeof ofBlanks === 'string'
      ? []
      : [limit(`${NAME} from blanks (MDL_b)`, ofBlanks.value, ofBlanks.basis, ofBlanks.formula)]),
    limit(
      NAME,
      value,
      `the larger of ${blankValue === null ? 'those there are' : 'MDL_S and MDL_b'}`,
      'max(MDL_S, MDL_b)',
    ),
  ];
  return {
    limits,
    notMade: typeof ofBlanks === 'string' ? [{ name: `${NAME} from blanks (MDL_b)`, reason: ofBlanks }] : [],
    flags: [...judgeDesign(study), ...judgeSpikes(study, value, unit)],
  };
}

function limit(name: string, value: number, basis: string, formula: string): LimitAnswer {
  return {
    name,
    kind: 'detection',
    value,
    basis,
    formula,
    alpha: 1 - CONFIDENCE,
    beta: null,
    source: SOURCE,
  };
}

interface Part {
  readonly value: number;
  readonly basis: string;
  readonly formula: string;
}

/** The part, or why it cannot be made. */
function fromSpikes(spikes: readonly StudySample[]): Part | string {
  if (spikes.length < LEAST) return `needs at least ${LEAST} spiked samples, got ${spikes.length}`;
  const values = numbersOf(spikes);
  const without = spikes.length - values.length;
  if (without > 0 || values.some((value) => value <= 0))
    return 'every spiked sample must give a number above zero; repeat the study with a higher spike';
  return {
    value: tQuantile(CONFIDENCE, values.length - 1) * Number(std([...values])),
    basis: `${values.length} spiked samples, one-sided 99 %`,
    formula: 't(0.99; n - 1) * S_s',
  };
}

function fromBlanks(blanks: readonly StudySample[]): Part | string {
  if (blanks.length < LEAST) return `needs at least ${LEAST} method blanks, got ${blanks.length}`;
  const values = numbersOf(blanks);
  if (values.length === 0) return 'no blank gave a number, so that it does not apply';
  if (values.length < blanks.length) {
    return {
      value: Math.max(...values),
      basis: `the highest of ${blanks.length} blanks, of which ${values.length} gave a number`,
      formula: 'max(x_b)',
    };
  }
  return {
    value:
      Math.max(0, mean([...values])) + tQuantile(CONFIDENCE, values.length - 1) * Number(std([...values])),
    basis: `${values.length} method blanks, one-sided 99 %`,
    formula: 'max(0, mean(x_b)) + t(0.99; n_b - 1) * S_b',
  };
}

function numbersOf(samples: readonly StudySample[]): readonly number[] {
  return samples.flatMap(({ value }) => (value === null ? [] : [value]));
}

function judgeDesign({ spikes, blanks }: MdlStudy): readonly Flag[] {
  const lacks: string[] = [];
  if (blanks.length < LEAST) lacks.push(`${blanks.length} of ${LEAST} blanks`);
  for (const [what, samples] of [
    ['spikes', spikes],
    ['blanks', blanks],
  ] as const) {
    for (const spread of ['batch', 'date'] as const) {
      const seen = new Set(samples.flatMap((sample) => sample[spread] ?? []));
      if (samples.length > 0 && seen.size < SPREAD_OVER)
        lacks.push(`${what} of ${seen.size} of ${SPREAD_OVER} ${spread === 'batch' ? 'batches' : 'dates'}`);
    }
  }
  return lacks.length === 0 ? [] : [flag('MDL_DESIGN', { detail: lacks.join(', ') })];
}

function judgeSpikes({ spikeLevel }: MdlStudy, mdl: number, unit: string): readonly Flag[] {
  if (spikeLevel === undefined) return [];
  const [low, high] = [2 * mdl, 10 * mdl];
  if (spikeLevel >= low && spikeLevel <= high) return [];
  const detail = `from ${significantText(low, 2)} to ${significantText(high, 2)} ${unit}`;
  return [flag('MDL_SPIKE_LEVEL', { value: spikeLevel, limit: mdl, unit, detail })];
}
