import type { StoredMethod } from '@/lib/curve/stored-curve';
import { parseUnit, type Weighting } from '@/lib/engine';
import type {
  CurveSummary,
  CurveVersionView,
  MethodView,
  StandardReadingView,
  StandardView,
} from '@/lib/views/curve';
import type { ReadingRow } from '../models/batches';
import type { CurveRow, MethodRow, StandardRow } from '../models/curves';

export type Names = ReadonlyMap<string, string>;

function unitOf(row: MethodRow): StoredMethod['unit'] {
  const unit = parseUnit(row.unit);
  if (!unit) throw new Error(`method ${row.id} has the unit ${row.unit}, which is none of ours`);
  return unit;
}

export function methodView(row: MethodRow): MethodView {
  return {
    id: row.id,
    version: row.version,
    analyte: row.analyte,
    basis: row.basis,
    formulaMass: row.formulaMass,
    unit: unitOf(row),
    signal: row.signal,
    wavelengthNm: row.wavelengthNm,
    readingRule: row.readingRule,
    pathLengthMm: row.pathLengthMm,
    pathLengthUMm: row.pathLengthUMm,
    pathLengthKnown: row.pathLengthKnown,
    standardsRelativeU: row.standardsRelativeU,
    blankRule: row.blankRule,
    model: row.model,
    weighting: row.weighting as Weighting, // written by the schema of the form only
    varianceFunction: row.varianceFunction ?? null,
    confidence: row.confidence,
    absorbanceLimit: row.absorbanceLimit,
    hazardNote: row.hazardNote,
  };
}

export function readingOfStandard(row: ReadingRow, spectrumNames: Names): StandardReadingView {
  return {
    id: row.id,
    position: row.position,
    value: row.value,
    minusValue: row.minusValue ?? null,
    gapReason: row.gapReason,
    gapText: row.gapText,
    signal: row.signal,
    origin: row.origin,
    spectrumId: row.spectrumId,
    spectrumName: row.spectrumId === null ? null : (spectrumNames.get(row.spectrumId) ?? null),
    rule: row.rule,
    excludedReason: row.excludedReason,
  };
}

export function standardView(row: StandardRow, readings: readonly StandardReadingView[]): StandardView {
  return {
    id: row.id,
    position: row.position,
    role: row.role,
    name: row.name,
    concentration: row.concentration,
    pathLengthMm: row.pathLengthMm,
    excludedReason: row.excludedReason,
    readings,
  };
}

export type LightCurve = Omit<CurveRow, 'result'>;

type VersionRow = Pick<
  CurveRow,
  'id' | 'version' | 'status' | 'createdAt' | 'createdById' | 'reason' | 'voidReason'
>;

/** The newest version that is not void, when it is later than this one. */
export function newerVersion(
  row: Pick<CurveRow, 'version'>,
  versions: readonly Pick<CurveRow, 'id' | 'version' | 'status'>[],
): CurveSummary['newer'] {
  const newer = versions
    .filter((other) => other.version > row.version && other.status !== 'void')
    .sort((a, b) => b.version - a.version)[0];
  return newer ? { id: newer.id, version: newer.version } : null;
}

export function curveVersionView(row: VersionRow, names: Names): CurveVersionView {
  return {
    id: row.id,
    version: row.version,
    status: row.status,
    createdAt: row.createdAt.toISOString(),
    createdBy: names.get(row.createdById) ?? 'unknown',
    reason: row.reason ?? null,
    voidReason: row.voidReason ?? null,
  };
}

export function curveSummary(
  row: CurveRow,
  method: MethodRow,
  versions: readonly LightCurve[],
  names: Names,
): CurveSummary {
  const { slope, residualSd, n, range } = row.result.curve;
  return {
    ...curveVersionView(row, names),
    notebookId: row.notebookId,
    lineageId: row.lineageId,
    title: row.title,
    analyte: method.analyte,
    basis: method.basis,
    unit: unitOf(method),
    wavelengthNm: method.wavelengthNm,
    slope: { value: slope.value, u: slope.u },
    residualSd,
    n,
    range: { min: range.min, max: range.max },
    newer: newerVersion(row, versions),
  };
}
