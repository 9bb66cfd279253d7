import { plusMinusText, significantText } from '../../format/round';
import { highestAsRead } from '../absorbance';
import type { ReportCase } from '../types';
import type { ConvertedReadings } from './convert-readings';
import type { Measuring } from './measuring';

/** Digits of a bound ("< 0.4 mg/L"): the standards' concentrations carry no uncertainty to round by. */
const BOUND_DIGITS = 4;

/** c equals a standard when it is the same to twelve digits: a perfect curve must read its own top standard back. */
const SAME = 1e-12;

/**
 * Which row of the table of report texts a determination falls into, compared in the measured solution, the first
 * that applies (measurement model, section 6).
 */
export function reportCase(
  { range, request }: Measuring,
  readings: ConvertedReadings,
  c: number | null,
  critical: number,
): ReportCase {
  const overLimit = readings.asRead.some((item) => highestAsRead(item) > request.absorbanceLimit);
  if (readings.state !== 'numbers' || overLimit || c === null) return 'notQuantified';
  if (c > range.max * (1 + SAME)) return 'aboveTopStandard';
  if (c >= range.min * (1 - SAME)) return 'value';
  return c >= critical ? 'belowLowestStandard' : 'belowCriticalValue';
}

export interface ReportFacts {
  readonly reportCase: ReportCase;
  readonly factor: number;
  /** In the sample. */
  readonly value: number | null;
  readonly expanded: number | null;
  readonly advice: string | null;
}

/** The text that leaves the notebook. */
export function reportText({ request, range }: Measuring, facts: ReportFacts): string {
  const { unit } = request;
  const bound = (c: number) => `${significantText(c * facts.factor, BOUND_DIGITS)} ${unit}`;
  const measured = () => `${plusMinusText(facts.value as number, facts.expanded as number)} ${unit}`;
  switch (facts.reportCase) {
    case 'notQuantified':
      return facts.advice === null ? 'not quantified: read again' : `not quantified: dilute ${facts.advice}`;
    case 'aboveTopStandard':
      return `> ${bound(range.max)}; dilute ${facts.advice}`;
    case 'value':
      return measured();
    case 'belowLowestStandard':
      return `${measured()}, detected, below the lowest standard`;
    case 'belowCriticalValue':
      return range.min > 0 ? `< ${bound(range.min)}` : 'not detected';
  }
}
