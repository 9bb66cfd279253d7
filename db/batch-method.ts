import { absorptivityRequest } from '@/lib/absorptivity/stored-absorptivity';
import { resultFromKnownAbsorptivity, type ReadingRule } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import type { BatchMethodView } from '@/lib/views/batch';
import { loadFor } from './access';
import type { OnWhat } from './batch-yardsticks';
import { methodView } from './views/curve';
import { storedAbsorptivity } from './views/absorptivity';

/** The method of a curve. */
export async function methodOfCurve(actor: Actor, curveId: string) {
  const { methodId } = await loadFor(actor, 'curve', 'read', curveId);
  return loadFor(actor, 'method', 'read', methodId);
}

/** The rule by which spectra are read for a batch. */
export async function readingRuleOf(actor: Actor, { curveId, absorptivityId }: OnWhat): Promise<ReadingRule> {
  if (curveId !== null) return (await methodOfCurve(actor, curveId)).readingRule;
  return (await loadFor(actor, 'absorptivity', 'read', absorptivityId ?? '')).readingRule;
}

/** How the samples of a batch are read, by its curve's method or by its known absorptivity. */
export async function batchMethod(actor: Actor, on: OnWhat): Promise<BatchMethodView> {
  return on.curveId === null ? onAbsorptivity(actor, on.absorptivityId ?? '') : onCurve(actor, on.curveId);
}

type Shared = Omit<BatchMethodView, 'range' | 'knownAbsorptivity'>;

/** What both have in common, field by field. */
const shared = (of: Shared): Shared => ({
  analyte: of.analyte,
  basis: of.basis,
  unit: of.unit,
  wavelengthNm: of.wavelengthNm,
  readingRule: of.readingRule,
  pathLengthMm: of.pathLengthMm,
  confidence: of.confidence,
  absorbanceLimit: of.absorbanceLimit,
  signal: of.signal,
  hazardNote: of.hazardNote,
});

async function onCurve(actor: Actor, curveId: string): Promise<BatchMethodView> {
  const curve = await loadFor(actor, 'curve', 'read', curveId);
  const method = methodView(await loadFor(actor, 'method', 'read', curve.methodId));
  return { ...shared(method), range: curve.result.curve.range, knownAbsorptivity: null };
}

async function onAbsorptivity(actor: Actor, id: string): Promise<BatchMethodView> {
  const stored = storedAbsorptivity(await loadFor(actor, 'absorptivity', 'read', id));
  const { kind, value, u, source, conditions } = stored;
  const { flags } = resultFromKnownAbsorptivity(absorptivityRequest(stored));
  return {
    ...shared(stored),
    range: null,
    knownAbsorptivity: { kind, value, u, source, conditions, flags },
  };
}
