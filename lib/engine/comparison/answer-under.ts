import { calculateUnknown } from '../calculate-unknown';
import { acceptRequest } from '../checks/accept-request';
import { pointAnswers, relativeStandardErrorPercent } from '../curve-points';
import { EngineError } from '../errors';
import { fitCurve, type FittedCurve } from '../fit-curve';
import type { CurveRequest, Refusal, UnknownResult, UnknownUnder, ValueWithU } from '../types';
import { Ledger } from '../working/ledger';

/** A curve with today's unknowns read back through it: what a comparison needs, without tests, limits and working. */
export interface Answered {
  readonly curve: FittedCurve;
  readonly unknowns: readonly UnknownResult[];
  readonly relativeStandardErrorPercent: number | null;
}

/** @throws EngineError as calculateStandardCurve does */
export function answerUnder(asked: CurveRequest): Answered {
  const request = acceptRequest(asked);
  const curve = fitCurve(request);
  return {
    curve,
    unknowns: request.unknowns.map((unknown, i) => calculateUnknown(curve, unknown, i, new Ledger())),
    relativeStandardErrorPercent: relativeStandardErrorPercent(curve, pointAnswers(curve)),
  };
}

/** What `work` gives, or the refusal it is answered with. */
export function orRefusal<T>(work: () => T): T | Refusal {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    return { code: error.code, reason: error.message };
  }
}

/** The unknowns under a changed curve beside the same under the curve in use. */
export function unknownsBeside(
  changed: readonly UnknownResult[],
  inUse: readonly UnknownResult[] | null,
): readonly UnknownUnder[] {
  return changed.map(({ name, measured, concentration, reportCase, report }, i) => ({
    name,
    measured,
    concentration: concentration && { value: concentration.value, u: concentration.u },
    reportCase,
    report,
    ...shiftOf(measured, inUse?.[i]?.measured ?? null),
  }));
}

function shiftOf(
  changed: ValueWithU | null,
  before: ValueWithU | null,
): Pick<UnknownUnder, 'changePercent' | 'changeInU'> {
  if (changed === null || before === null) return { changePercent: null, changeInU: null };
  const shift = changed.value - before.value;
  return {
    changePercent: before.value === 0 ? null : (100 * shift) / before.value,
    changeInU: before.u === 0 ? null : shift / before.u,
  };
}
