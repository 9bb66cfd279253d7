import { transmittanceOf } from './absorbance';
import { criticalValue } from './calibration/critical-value';
import { fiellerInterval } from './calibration/fieller';
import type { FittedCurve } from './fit-curve';
import type { Concentration, ReportCase, UnknownRequest, UnknownResult } from './types';
import type { Expanded } from './uncertainty/combine';
import { coverageFactor } from './uncertainty/expand';
import { makeBudget } from './unknown/budget';
import { convertReadings } from './unknown/convert-readings';
import { adviceText, adviseDilution, aimOfCurve } from './unknown/dilution-advice';
import { judgeUnknown } from './unknown/judge';
import { type ReadBack, readBack } from './unknown/read-back';
import { reportCase, reportText } from './unknown/report';
import { type Scaling, scalingOf } from './unknown/scaling';
import { Ledger } from './working/ledger';
import { recordUnknown } from './working/record-unknown';

/** Cases whose text asks for a dilution. */
export function wantsDilution(kind: ReportCase): boolean {
  return kind === 'notQuantified' || kind === 'aboveTopStandard';
}

/** Cases that leave with a number. */
export function isQuantified(kind: ReportCase): boolean {
  return kind === 'value' || kind === 'belowLowestStandard';
}

export function concentrationOf(result: Expanded, unit: Concentration['unit']): Concentration {
  const { value, u, U, k, degreesOfFreedom } = result;
  return {
    value,
    u,
    U,
    k,
    degreesOfFreedom: Number.isFinite(degreesOfFreedom) ? degreesOfFreedom : null,
    interval: [value - U, value + U],
    unit,
  };
}

/** Fieller's interval in the sample, for lines. */
function fiellerOf(
  curve: FittedCurve,
  y0: number,
  back: ReadBack,
  scaling: Scaling,
): [number, number] | null {
  if (curve.fit.model === 'quadratic') return null;
  const t = coverageFactor(curve.request.confidence, curve.fit.degreesOfFreedom);
  const { interval } = fiellerInterval(curve.fit, y0, back.varianceY0, t);
  return interval && [interval[0] * scaling.value, interval[1] * scaling.value];
}

/** One determination: readings to absorbance, read back, diluted, with its budget, report text, flags and working. */
export function calculateUnknown(
  curve: FittedCurve,
  unknown: UnknownRequest,
  index: number,
  curveLedger: Ledger,
): UnknownResult {
  const readings = convertReadings(curve, unknown, `/unknowns/${index}`);
  const back = readBack(curve, readings, unknown);
  const scaling = scalingOf(unknown.dilution, unknown.recovery ?? curve.request.recovery);
  const budget = back && makeBudget(curve, unknown, readings, back, scaling);
  const critical = criticalValue(curve, Math.max(1, readings.y.length), readings.pathLengthMm);
  const kind = reportCase(curve, readings, back?.c ?? null, critical.value);
  const dilute = wantsDilution(kind) && readings.state !== 'nothing';
  const dilutionAdvice = dilute
    ? adviseDilution(aimOfCurve(curve), readings, back?.c ?? null, unknown.wingEstimate)
    : null;
  const advice = dilutionAdvice && adviceText(dilutionAdvice, scaling.factor.value > 1);
  const report = reportText(curve, {
    reportCase: kind,
    factor: scaling.value,
    value: budget?.value ?? null,
    expanded: budget?.U ?? null,
    advice,
  });
  const quantified = isQuantified(kind) && budget !== null;
  const ledger = new Ledger(curveLedger, (lines) =>
    recordUnknown(lines, { curve, unknown, readings, back, scaling, budget, critical, report }),
  );
  return {
    name: unknown.name ?? `unknown ${index + 1}`,
    absorbanceAsRead: readings.meanAsRead,
    absorbanceAtLeast: readings.atLeast,
    absorbance: readings.meanY,
    transmittance: readings.meanAsRead === null ? null : transmittanceOf(readings.meanAsRead),
    measured: back && { value: back.c, u: back.u },
    dilutionFactor: { value: scaling.factor.value, u: scaling.factor.u },
    ...(scaling.recovery ? { recovery: scaling.recovery } : {}),
    concentration: quantified ? concentrationOf(budget, curve.request.unit) : null,
    computed: budget?.value ?? null,
    fieller: quantified && back ? fiellerOf(curve, readings.meanY as number, back, scaling) : null,
    criticalValue: critical.value,
    budget: budget?.lines ?? [],
    reportCase: kind,
    report,
    flags: judgeUnknown({
      curve,
      unknown,
      readings,
      back,
      reportCase: kind,
      critical: critical.value,
      advice,
    }),
    ...(advice === null ? {} : { advice }),
    ...(dilutionAdvice === null ? {} : { dilutionAdvice }),
    get working() {
      return ledger.steps;
    },
  };
}
