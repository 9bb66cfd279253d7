import type { BlankRequest, CurveRequest, Reading, Signal } from '@/lib/engine';
import { readingInSignal } from './reading-in-signal';
import type { CalculatedMethod, StoredStandard } from './stored-curve';

/** Blank readings by path. One that is left out takes no part, so it does not reach the calculation. */
function blankOf(method: CalculatedMethod, standards: readonly StoredStandard[]): BlankRequest | undefined {
  if (method.blankRule === 'none') return undefined;
  const byPath = new Map<number, Reading[]>([[method.pathLengthMm, []]]);
  for (const blank of standards) {
    if (blank.role !== 'blank' || blank.excludedReason !== null) continue;
    const readings = blank.readings.filter((reading) => reading.excludedReason === null);
    byPath.set(blank.pathLengthMm, [
      ...(byPath.get(blank.pathLengthMm) ?? []),
      ...readings.map((reading) => readingInSignal(reading, method.signal)),
    ]);
  }
  const own = byPath.get(method.pathLengthMm) ?? [];
  byPath.delete(method.pathLengthMm);
  const otherPaths = [...byPath].map(([pathLengthMm, readings]) => ({ pathLengthMm, readings }));
  return { use: method.blankRule, readings: own, ...(otherPaths.length > 0 ? { otherPaths } : {}) };
}

function standardOf(standard: StoredStandard, signal: Signal) {
  const excludedReadings = standard.readings.flatMap((reading, position) =>
    reading.excludedReason === null ? [] : [position],
  );
  return {
    name: standard.name,
    concentration: standard.concentration,
    readings: standard.readings.map((reading) => readingInSignal(reading, signal)),
    pathLengthMm: standard.pathLengthMm,
    ...(standard.excludedReason === null ? {} : { excluded: true }),
    ...(excludedReadings.length === 0 ? {} : { excludedReadings }),
  };
}

/** The request that the engine answers for a kept curve, without unknowns. */
export function curveRequest(method: CalculatedMethod, standards: readonly StoredStandard[]): CurveRequest {
  const blank = blankOf(method, standards);
  return {
    signal: method.signal,
    pathLengthMm: method.pathLengthMm,
    ...(method.pathLengthUMm === null ? {} : { pathLengthUMm: method.pathLengthUMm }),
    pathLengthKnown: method.pathLengthKnown,
    unit: method.unit,
    ...(method.formulaMass === null ? {} : { formulaMass: method.formulaMass }),
    model: method.model,
    weighting: method.weighting,
    ...(method.varianceFunction === null ? {} : { varianceFunction: method.varianceFunction }),
    confidence: method.confidence,
    absorbanceLimit: method.absorbanceLimit,
    ...(blank ? { blank } : {}),
    standards: standards.filter(({ role }) => role === 'standard').map((s) => standardOf(s, method.signal)),
    ...(method.standardsRelativeU === null ? {} : { standardsRelativeU: method.standardsRelativeU }),
    unknowns: [],
  };
}
