import { calculateUnknown } from './calculate-unknown';
import { type CriticalValue, criticalValue } from './calibration/critical-value';
import { molarAbsorptivity } from './calibration/molar-absorptivity';
import { acceptRequest } from './checks/accept-request';
import { levelAnswers, pointAnswers, relativeStandardErrorPercent } from './curve-points';
import { fitCurve, type FittedCurve } from './fit-curve';
import { curveJudgements, curveTests } from './hypothesis/curve-tests';
import { levelsOf } from './hypothesis/levels';
import { judgeCurve } from './judge-curve';
import { detectionLimits } from './limits/curve-limits';
import { coefficientOf } from './regression/fit';
import type { CurveAnswer, CurveRequest, CurveResult, MolarAbsorptivity } from './types';
import { ENGINE_VERSION } from './version';
import { Ledger } from './working/ledger';
import { recordCritical } from './working/record-critical';
import { recordCurve } from './working/record-curve';

/**
 * Fit a standard curve and read every unknown back through it, by the measurement model of Halflight: reading,
 * absorbance, censoring, blank of the same path, per 10 mm, fit or read-back, dilution, budget, report.
 *
 * Pure: the same request gives the same answer, in the browser and on the server. Wrong calls throw; doubtful data
 * come back with flags. Nothing is rounded but the texts.
 *
 * @throws EngineError with a code of ENGINE_ERRORS and a JSON pointer to the member of the request at fault
 */
export function calculateStandardCurve(asked: CurveRequest): CurveAnswer {
  const request = acceptRequest(asked);
  const curve = fitCurve(request);
  const epsilon = molarAbsorptivity(curve);
  const critical = criticalOfCurve(curve);
  const ledger = new Ledger(undefined, (lines) => {
    recordCurve(lines, curve, epsilon);
    recordCritical(lines, curve, critical, 'curve');
  });
  return {
    engine: ENGINE_VERSION,
    curve: curveResult(curve, epsilon, critical, ledger),
    unknowns: request.unknowns.map((unknown, i) => calculateUnknown(curve, unknown, i, ledger)),
  };
}

/** For the fewest readings any unknown has, one when there is none: the most cautious of their critical values. */
function criticalOfCurve(curve: FittedCurve): CriticalValue {
  const counts = curve.request.unknowns.map((unknown) => unknown.readings.length);
  const fewest = counts.length === 0 ? 1 : Math.min(...counts);
  return criticalValue(curve, fewest, curve.request.pathLengthMm);
}

function curveResult(
  curve: FittedCurve,
  epsilon: MolarAbsorptivity | undefined,
  critical: CriticalValue,
  ledger: Ledger,
): CurveResult {
  const { fit, request, range } = curve;
  const points = pointAnswers(curve);
  const grouped = levelsOf(curve.data);
  const levels = levelAnswers(curve, grouped);
  const tests = curveTests(curve, grouped);
  return {
    model: fit.model,
    weighting: request.weighting,
    unit: request.unit,
    confidence: request.confidence,
    n: fit.n,
    degreesOfFreedom: fit.degreesOfFreedom,
    intercept: coefficientOf(fit, 0),
    slope: coefficientOf(fit, 1),
    ...(fit.model === 'quadratic' ? { quadratic: coefficientOf(fit, 2) } : {}),
    covariance: fit.covariance,
    residualSd: fit.residualSd,
    rSquared: fit.rSquared,
    relativeStandardErrorPercent: relativeStandardErrorPercent(curve, points),
    meanConcentration: fit.meanX,
    sxx: fit.sxx,
    range,
    criticalValue: critical.value,
    criticalValueReadings: critical.readings,
    ...(epsilon ? { molarAbsorptivity: epsilon } : {}),
    tests,
    judgements: curveJudgements(curve, grouped, points),
    limits: detectionLimits(curve, critical.readings),
    points,
    levels,
    flags: judgeCurve({ curve, points, levels, tests, criticalValue: critical.value }),
    get working() {
      return ledger.steps;
    },
  };
}
