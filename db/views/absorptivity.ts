import type { StoredAbsorptivity } from '@/lib/absorptivity/stored-absorptivity';
import { parseUnit } from '@/lib/engine';
import type { AbsorptivitySummary } from '@/lib/views/absorptivity';
import type { AbsorptivityRow } from '../models/absorptivities';
import { curveVersionView, newerVersion, type Names } from './curve';

export function storedAbsorptivity(row: AbsorptivityRow): StoredAbsorptivity {
  const unit = parseUnit(row.unit);
  if (!unit) throw new Error(`absorptivity ${row.id} has the unit ${row.unit}, which is none of ours`);
  return {
    analyte: row.analyte,
    basis: row.basis,
    formulaMass: row.formulaMass,
    unit,
    signal: row.signal,
    kind: row.kind,
    value: row.value,
    u: row.u,
    source: row.source,
    conditions: row.conditions,
    wavelengthNm: row.wavelengthNm,
    readingRule: row.readingRule,
    pathLengthMm: row.pathLengthMm,
    pathLengthUMm: row.pathLengthUMm,
    readingSd: row.readingSd,
    confidence: row.confidence,
    absorbanceLimit: row.absorbanceLimit,
    hazardNote: row.hazardNote,
  };
}

export function absorptivitySummary(
  row: AbsorptivityRow,
  versions: readonly Pick<AbsorptivityRow, 'id' | 'version' | 'status'>[],
  names: Names,
): AbsorptivitySummary {
  return {
    ...storedAbsorptivity(row),
    ...curveVersionView(row, names),
    notebookId: row.notebookId,
    lineageId: row.lineageId,
    title: row.title,
    newer: newerVersion(row, versions),
  };
}
