import { transmittanceOf } from '../absorbance';
import { concentrationOf, isQuantified, wantsDilution } from '../calculate-unknown';
import { DETECTION_CONFIDENCE } from '../calibration/critical-value';
import { NORMAL_PATH_MM } from '../prepare-points';
import { tQuantile } from '../stats/student-t';
import { type Aim, adviceText, adviseDilution } from '../unknown/dilution-advice';
import { convertReadings } from '../unknown/convert-readings';
import { reportCase, reportText } from '../unknown/report';
import { scalingOf } from '../unknown/scaling';
import { ENGINE_VERSION } from '../version';
import { Ledger } from '../working/ledger';
import { recordDirect, recordMethod } from '../working/record-direct';
import { blankMean, knownSd } from './direct-blanks';
import { directBudget } from './direct-budget';
import { judgeBlanks, judgeDirect } from './judge-direct';
import { type MeanReading, meanReading } from './mean-reading';
import type { DirectMethod } from './method';
import type { DirectAnswer, DirectRequest, DirectResult } from './types';

/** The measured solution itself. */
const UNDILUTED = scalingOf([], undefined);

type Unknown = DirectRequest['unknowns'][number];

/** Every unknown of a method without a curve: the same steps, report rules and budget as on a curve. */
export function calculateDirect(method: DirectMethod): DirectAnswer {
  const ledger = new Ledger(undefined, (lines) => recordMethod(lines, method));
  return {
    engine: ENGINE_VERSION,
    basis: method.basis,
    flags: [...method.flags, ...judgeBlanks(method)],
    get working() {
      return ledger.steps;
    },
    unknowns: method.request.unknowns.map((unknown, i) => directResult(method, unknown, i, ledger)),
  };
}

function directResult(method: DirectMethod, unknown: Unknown, index: number, above: Ledger): DirectResult {
  const { request } = method;
  const pointer = `/unknowns/${index}`;
  const readings = convertReadings(method.measuring, unknown, pointer);
  const { meanY, pathLengthMm } = readings;
  const mean = meanY === null ? null : meanReading(readings.y, knownSd(request, pathLengthMm));
  const read = meanY === null ? null : method.read(meanY);
  const scaling = scalingOf(unknown.dilution, unknown.recovery ?? request.recovery);
  const facts = mean && read && { method, unknown, readings, mean, read };
  const budget = facts && directBudget({ ...facts, scaling });
  const critical = criticalValueOf(method, pathLengthMm, Math.max(1, readings.y.length));
  const { range } = method.measuring;
  const measuring = { ...method.measuring, range: { ...range, min: Math.max(range.min, critical ?? 0) } };
  const kind = reportCase(measuring, readings, read?.c ?? null, critical ?? 0);
  const dilute = wantsDilution(kind) && readings.state !== 'nothing';
  const advised = dilute
    ? adviseDilution(aimOf(method), readings, read?.c ?? null, unknown.wingEstimate)
    : null;
  const advice = advised && adviceText(advised, scaling.factor.value > 1);
  const value = budget?.value ?? null;
  const report = reportText(measuring, {
    reportCase: kind,
    factor: scaling.value,
    value,
    expanded: budget?.U ?? null,
    advice,
  });
  const ledger = new Ledger(above, (lines) =>
    recordDirect(lines, { method, unknown, readings, mean, read, scaling, budget, critical, report }),
  );
  return {
    name: unknown.name ?? `unknown ${index + 1}`,
    absorbanceAsRead: readings.meanAsRead,
    absorbanceAtLeast: readings.atLeast,
    absorbance: meanY,
    transmittance: readings.meanAsRead === null ? null : transmittanceOf(readings.meanAsRead),
    measured: facts && { value: facts.read.c, u: directBudget({ ...facts, scaling: UNDILUTED }).u },
    dilutionFactor: { value: scaling.factor.value, u: scaling.factor.u },
    ...(scaling.recovery ? { recovery: scaling.recovery } : {}),
    concentration: isQuantified(kind) && budget ? concentrationOf(budget, request.unit) : null,
    computed: value,
    fieller: null,
    criticalValue: critical,
    budget: budget?.lines ?? [],
    reportCase: kind,
    report,
    flags: judgeDirect({ method, unknown, readings, mean, read, reportCase: kind, critical, advice }),
    ...(advice === null ? {} : { advice }),
    ...(advised === null ? {} : { dilutionAdvice: advised }),
    get working() {
      return ledger.steps;
    },
  };
}

/**
 * x_C = t(0.95; ν) s √(1/K + 1/p_b) · ∂c/∂y at zero, with s known beforehand or from the blanks; null when neither
 * is, since then nothing says what can be told from a blank.
 */
function criticalValueOf(method: DirectMethod, pathLengthMm: number, K: number): number | null {
  const { request, measuring } = method;
  const blank = blankMean(request, measuring.blanks, pathLengthMm);
  const sd = request.readingSd ?? blank?.sd ?? null;
  if (sd === null) return null;
  const nu = request.readingSd === undefined ? (blank as MeanReading).degreesOfFreedom : Infinity;
  const count = measuring.blanks.countAt(pathLengthMm);
  const perMm = NORMAL_PATH_MM / pathLengthMm;
  const spread = sd * perMm * Math.sqrt(1 / K + (count === 0 ? 0 : 1 / count));
  return tQuantile(DETECTION_CONFIDENCE, nu) * spread * Math.abs(method.read(0).perAbsorbance);
}

function aimOf(method: DirectMethod): Aim {
  const { measuring } = method;
  return {
    measuring,
    absorbanceAt: (concentration) => method.absorbanceAt(concentration),
    concentrationAimedAt: (cap) => {
      const top = Number.isFinite(measuring.range.max) ? method.absorbanceAt(measuring.range.max) : Infinity;
      return method.read(Math.min(cap, top)).c;
    },
  };
}
