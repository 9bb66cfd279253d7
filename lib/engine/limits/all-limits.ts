import { absorbanceOf } from '../absorbance';
import { acceptRequest } from '../checks/accept-request';
import { requireChoice, requireFinite, requirePositive } from '../checks/require';
import { below, EngineError } from '../errors';
import { fitCurve, type FittedCurve } from '../fit-curve';
import type { Flag } from '../flags';
import { normalise } from '../prepare-points';
import { coefficientOf, slopeAt } from '../regression/fit';
import type { CurveRequest, LimitAnswer, Reading } from '../types';
import { CONCENTRATION_UNIT_NAMES, type ConcentrationUnit, parseUnit } from '../units';
import { ENGINE_VERSION } from '../version';
import { blankScatter, type BlankScatter, scatterOf } from './blank-scatter';
import { currieLimits } from './currie';
import { ichOfBlank, INTERCEPT, USUAL_RISKS } from './curve-limits';
import { din32645Limits, iso11843Limits } from './from-calibration';
import { ichLimits } from './ich';
import { type MdlStudy, methodDetectionLimit } from './mdl';

export interface LimitsRequest {
  readonly unit: ConcentrationUnit;
  readonly curve?: CurveRequest;
  /** K, readings of an unknown; default 1. */
  readonly readings?: number;
  /** Blank readings in the signal and path of the curve, instead of those in it. */
  readonly blankReadings?: readonly Reading[];
  /** Risks for ISO 11843-2; default 5 % each. */
  readonly alpha?: number;
  readonly beta?: number;
  /** From the measured solution to the sample; default 1. */
  readonly factor?: number;
  /** Results of the whole method, in the sample and in `unit`. */
  readonly study?: MdlStudy;
}

export interface LimitNotMade {
  readonly name: string;
  readonly reason: string;
}

/** Every limit that the data allow, in the sample, and of each other the reason why not. */
export interface LimitsAnswer {
  readonly engine: string;
  readonly unit: ConcentrationUnit;
  readonly limits: readonly LimitAnswer[];
  readonly notMade: readonly LimitNotMade[];
  readonly flags: readonly Flag[];
}

/**
 * All limits of detection and quantitation at once, on one scale: ICH Q2 with its three σ, Currie with its three
 * blanks, ISO 11843-2, DIN 32645, 40 CFR 136. They are answers to different questions, and differ.
 *
 * @throws EngineError UNKNOWN_CHOICE, BLANK_CENSORED and those of the curve, with pointers under /curve
 */
export function allLimits(asked: LimitsRequest): LimitsAnswer {
  const unit = parseUnit(asked.unit) ?? asked.unit;
  checkLimits({ ...asked, unit });
  const curve = asked.curve ? fitted(asked.curve, unit) : null;
  const factor = asked.factor ?? 1;
  const ofCurve = curve ? curveFamily(curve, asked) : WITHOUT_CURVE;
  const blank = curve ? blankOf(curve, asked.blankReadings) : blankOfStudy(asked.study);
  const ofBlank = blankFamily(blank);
  const ofStudy = asked.study ? methodDetectionLimit(asked.study, unit) : WITHOUT_STUDY;
  const inSample = (limit: LimitAnswer) => ({ ...limit, value: limit.value * factor });
  return {
    engine: ENGINE_VERSION,
    unit,
    limits: [
      ...ofCurve.limits.map(inSample),
      ...(curve ? ofBlank.limits.map(inSample) : ofBlank.limits),
      ...ofStudy.limits,
    ],
    notMade: [...ofCurve.notMade, ...ofBlank.notMade, ...ofStudy.notMade],
    flags: ofStudy.flags,
  };
}

function checkLimits({ unit, readings, alpha, beta, factor, study }: LimitsRequest): void {
  requireChoice(unit, CONCENTRATION_UNIT_NAMES, 'the unit', '/unit');
  requirePositive(readings, 'NO_READINGS', 'the number of readings', '/readings');
  requirePositive(factor, 'VOLUME_NOT_POSITIVE', 'the factor to the sample', '/factor');
  requirePositive(study?.spikeLevel, 'CONCENTRATION_NEGATIVE', 'the spike', '/study/spikeLevel');
  for (const kind of ['spikes', 'blanks'] as const) {
    study?.[kind].forEach(({ value }, i) =>
      requireFinite(value ?? undefined, 'a result of the study', `/study/${kind}/${i}/value`),
    );
  }
  for (const [name, risk] of Object.entries({ alpha, beta })) {
    if (risk !== undefined && !(risk > 0 && risk < 0.5)) {
      throw new EngineError(
        'CONFIDENCE_OUT_OF_RANGE',
        `${name} must lie between 0 and 0.5, got ${risk}`,
        `/${name}`,
      );
    }
  }
}

function fitted(asked: CurveRequest, unit: ConcentrationUnit): FittedCurve {
  const request = below('/curve', () => acceptRequest(asked));
  if (request.unit !== unit) {
    throw new EngineError(
      'UNKNOWN_CHOICE',
      `the curve must be in the unit of the limits, ${unit}, got ${request.unit}`,
      '/curve/unit',
    );
  }
  return below('/curve', () => fitCurve(request));
}

interface Family {
  readonly limits: readonly LimitAnswer[];
  readonly notMade: readonly LimitNotMade[];
}

const NEEDS_CURVE = 'needs a calibration curve, and none was given';
const WITHOUT_CURVE: Family = {
  limits: [],
  notMade: ['ICH Q2, residual standard deviation', 'ICH Q2, intercept', 'ISO 11843-2', 'DIN 32645'].map(
    (name) => ({ name, reason: NEEDS_CURVE }),
  ),
};
const WITHOUT_STUDY = {
  limits: [],
  notMade: [
    {
      name: '40 CFR 136 method detection limit',
      reason: 'needs at least 7 spiked samples and 7 blanks through the whole method, and none were given',
    },
  ],
  flags: [],
} as const;

function curveFamily(curve: FittedCurve, { readings = 1, alpha, beta }: LimitsRequest): Family {
  const { fit } = curve;
  const slope = Math.abs(slopeAt(fit, 0));
  const risks = { alpha: alpha ?? USUAL_RISKS.alpha, beta: beta ?? USUAL_RISKS.beta };
  const throughZero = fit.model === 'proportional';
  const din = din32645Limits(curve, readings);
  const quantified = din.some((limit) => limit.kind === 'quantification');
  return {
    limits: [
      ...ichLimits(fit.residualSd, slope, 'the residual standard deviation'),
      ...(throughZero ? [] : ichLimits(coefficientOf(fit, 0).u, slope, INTERCEPT)),
      ...iso11843Limits(curve, readings, risks),
      ...din,
    ],
    notMade: [
      ...(throughZero
        ? [{ name: 'ICH Q2, intercept', reason: 'a line through zero has no intercept to be uncertain' }]
        : []),
      ...(quantified
        ? []
        : [
            {
              name: 'DIN 32645 quantification limit',
              reason: 'the slope is too uncertain for any concentration to be known to a third',
            },
          ]),
    ],
  };
}

/** Blank readings given for the limits, else those of the curve. */
function blankOf(curve: FittedCurve, readings: readonly Reading[] | undefined): BlankScatter | null {
  const slope = Math.abs(slopeAt(curve.fit, 0));
  if (!readings) return blankScatter(curve, slope);
  const { signal, pathLengthMm } = curve.request;
  const values = readings.map((reading, i) => {
    const { value } = absorbanceOf(reading, signal, `/blankReadings/${i}`);
    if (value === null) {
      throw new EngineError('BLANK_CENSORED', 'a blank reading must have a number', `/blankReadings/${i}`);
    }
    return normalise(value, null, pathLengthMm);
  });
  return scatterOf(values, slope, 'blank readings');
}

function blankOfStudy(study: MdlStudy | undefined): BlankScatter | null {
  const values = (study?.blanks ?? []).flatMap(({ value }) => value ?? []);
  return scatterOf(values, 1, 'method blanks');
}

function blankFamily(blank: BlankScatter | null): Family {
  if (blank) return { limits: [...ichOfBlank(blank), ...currieLimits(blank, true)], notMade: [] };
  const reason = 'needs at least two blanks with a number';
  return {
    limits: [],
    notMade: [
      { name: 'ICH Q2, blank', reason },
      { name: 'Currie', reason },
    ],
  };
}
