import { type Flag, flag } from '../flags';
import type { ReportCase, UnknownRequest } from '../types';
import { isOtherCell } from '../unknown/budget';
import type { ConvertedReadings } from '../unknown/convert-readings';
import { judgeAsRead } from '../unknown/judge';
import { blankMean } from './direct-blanks';
import { pathU } from './direct-budget';
import type { MeanReading } from './mean-reading';
import type { DirectMethod, DirectRead } from './method';

export interface DirectJudged {
  readonly method: DirectMethod;
  readonly unknown: UnknownRequest;
  readonly readings: ConvertedReadings;
  readonly mean: MeanReading | null;
  readonly read: DirectRead | null;
  readonly reportCase: ReportCase;
  readonly critical: number | null;
  readonly advice: string | null;
}

/** Everything worth saying about one unknown of a method without a curve, the gravest first. */
export function judgeDirect(facts: DirectJudged): readonly Flag[] {
  const { method, readings, advice } = facts;
  return [
    ...judgeAsRead(method.request.absorbanceLimit, readings, advice),
    ...judgePlace(facts),
    ...judgeScatter(facts),
    ...judgePath(facts),
  ];
}

function judgePlace({ method, readings, read, reportCase, critical, advice }: DirectJudged): readonly Flag[] {
  if (!read || reportCase === 'notQuantified') return [];
  const { unit } = method.request;
  const { range } = method.measuring;
  const detail = `${advice}.`;
  const value = read.c;
  const own = method.judge(readings, value);
  switch (reportCase) {
    case 'aboveTopStandard':
      return [flag('OVER_TOP_STANDARD', { value, limit: range.max, unit, detail }), ...own];
    case 'belowLowestStandard':
      return [flag('UNDER_LOWEST_STANDARD', { value, limit: range.min, unit }), ...own];
    case 'belowCriticalValue':
      return critical === null
        ? [flag('READING_NEGATIVE', { value: readings.meanY as number, limit: 0 })]
        : [flag('NOT_DETECTED', { value, limit: critical, unit })];
    case 'value':
      return own;
  }
}

function judgeScatter({ unknown, mean }: DirectJudged): readonly Flag[] {
  if (!mean) return [];
  if (mean.sd === null) return [flag('READING_WITHOUT_U', { name: unknown.name ?? 'The unknown' })];
  return judgeApart(mean);
}

/** Replicates further apart than the scatter stated beforehand allows. */
export function judgeApart({ apart }: MeanReading, of = ''): readonly Flag[] {
  if (!apart) return [];
  const { range, limit, own } = apart;
  const used = own ? 'Their own standard deviation' : 'The stated standard deviation';
  const detail = `${of}${used}, the larger one, is used.`;
  return [flag('REPLICATES_APART', { value: range, limit, detail })];
}

/** The blanks of a method, path by path. */
export function judgeBlanks({ request, measuring }: DirectMethod): readonly Flag[] {
  const paths = new Set(measuring.blanks.readings.map((blank) => blank.pathLengthMm));
  return [...paths].flatMap((pathLengthMm) => {
    const blank = blankMean(request, measuring.blanks, pathLengthMm) as MeanReading;
    return judgeApart(blank, `These are the blanks at ${pathLengthMm} mm. `);
  });
}

function judgePath({ method, unknown, readings }: DirectJudged): readonly Flag[] {
  const { request } = method;
  if (!method.pathCancels) {
    return pathU({ method, unknown }) > 0 ? [] : [flag('PATH_WITHOUT_U', { value: readings.pathLengthMm })];
  }
  return isOtherCell({ request }, unknown) && !((unknown.pathLengthUMm ?? 0) > 0)
    ? [flag('CELL_WITHOUT_U', { value: readings.pathLengthMm, limit: request.pathLengthMm })]
    : [];
}
