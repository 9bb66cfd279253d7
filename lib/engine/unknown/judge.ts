import { highestAsRead } from '../absorbance';
import { isAboveRange } from '../censoring';
import type { FittedCurve } from '../fit-curve';
import { type Flag, flag } from '../flags';
import type { ReportCase, UnknownRequest } from '../types';
import { isOtherCell } from './budget';
import type { ConvertedReadings } from './convert-readings';
import type { ReadBack } from './read-back';

export interface UnknownFacts {
  readonly curve: FittedCurve;
  readonly unknown: UnknownRequest;
  readonly readings: ConvertedReadings;
  readonly back: ReadBack | null;
  readonly reportCase: ReportCase;
  readonly critical: number;
  readonly advice: string | null;
}

/** Everything worth saying about one unknown, the gravest first. */
export function judgeUnknown(facts: UnknownFacts): readonly Flag[] {
  return [...judgeReadings(facts), ...judgePlace(facts), ...judgePrecision(facts)];
}

/** What the readings say by themselves, as they came. */
export function judgeAsRead(limit: number, readings: ConvertedReadings, advice: string | null): Flag[] {
  const flags: Flag[] = [];
  const detail = `${advice ?? ''}.`;
  const highest = Math.max(...readings.asRead.map(highestAsRead));
  const without = readings.asRead.flatMap((item) => (item.censored ? [item.censored] : []));
  const above = without.find((item) => isAboveRange(item.reason));
  const [first] = without;
  if (above) flags.push(flag('READING_CENSORED', { name: above.text, detail }));
  if (highest > limit) flags.push(flag('READING_OVER_LIMIT', { value: highest, limit, detail }));
  if (first && readings.state === 'nothing') flags.push(flag('READING_WITHOUT_NUMBER', { name: first.text }));
  if (first && readings.state === 'numbers') {
    flags.push(
      flag('READING_LEFT_OUT', { value: without.length, limit: readings.asRead.length, name: first.text }),
    );
  }
  return flags;
}

function judgeReadings({ curve, readings, back, advice }: UnknownFacts): Flag[] {
  const flags = judgeAsRead(curve.request.absorbanceLimit, readings, advice);
  if (readings.meanY !== null && back) {
    const floor = (-3 * curve.fit.residualSd) / Math.sqrt(back.weight);
    if (readings.meanY < floor) flags.push(flag('READING_NEGATIVE', { value: readings.meanY, limit: floor }));
  }
  return flags;
}

function judgePlace(facts: UnknownFacts): Flag[] {
  const { curve, readings, back, critical, advice } = facts;
  const { range } = curve;
  const { unit } = curve.request;
  if (readings.meanY !== null && !back) {
    return [flag('CURVE_GIVES_NO_ROOT', { value: readings.meanY, detail: `${advice}.` })];
  }
  const value = back?.c ?? NaN;
  switch (facts.reportCase) {
    // Above the absorbance limit there is no number to place.
    case 'notQuantified':
      return [];
    case 'aboveTopStandard':
      return [flag('OVER_TOP_STANDARD', { value, limit: range.max, unit, detail: `${advice}.` })];
    case 'value':
      return value < critical ? [flag('VALUE_UNDER_CRITICAL', { value, limit: critical, unit })] : [];
    case 'belowLowestStandard':
      return [flag('UNDER_LOWEST_STANDARD', { value, limit: range.min, unit })];
    case 'belowCriticalValue':
      return [flag('NOT_DETECTED', { value, limit: critical, unit })];
  }
}

function judgePrecision({ curve, unknown, readings, back }: UnknownFacts): Flag[] {
  const flags: Flag[] = [];
  if (back?.replicates.disagree) {
    const { own, range, limit } = back.replicates;
    const detail = own
      ? 'Their own standard deviation, the larger one, is used for the uncertainty.'
      : "The curve's standard deviation, the larger one, is used for the uncertainty.";
    flags.push(flag('REPLICATES_APART', { value: range, limit, detail }));
  }
  if (isOtherCell(curve, unknown) && !((unknown.pathLengthUMm ?? 0) > 0)) {
    flags.push(flag('CELL_WITHOUT_U', { value: readings.pathLengthMm, limit: curve.request.pathLengthMm }));
  }
  return flags;
}
