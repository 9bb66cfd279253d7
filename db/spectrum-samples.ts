import type { ReadingRule } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { AddSpectrumSamples } from '@/lib/schemas/determination';
import type { SpectrumReadingView } from '@/lib/views/spectrum';
import { loadFor } from './access';
import type { NewReading, NewSample } from './determination-rows';
import type { BatchRow } from './models/batches';
import { readingsFromSpectra } from './queries/spectra';

/** The method of a batch's curve. */
export async function methodOfCurve(actor: Actor, curveId: string) {
  const { methodId } = await loadFor(actor, 'curve', 'read', curveId);
  return loadFor(actor, 'method', 'read', methodId);
}

/**
 * What was read off a spectrum, as a reading to keep. With a second wavelength subtracted the difference may
 * look harmless while the reading itself was above the absorbance limit; such a reading is kept as a gap.
 */
export function readingOf(read: SpectrumReadingView, rule: ReadingRule, absorbanceLimit: number): NewReading {
  const from = { signal: 'absorbance', origin: 'spectrum', spectrumId: read.spectrumId, rule } as const;
  if (read.value === null)
    return { ...from, value: null, gapReason: read.gapReason ?? 'missing', gapText: textOfGap(read) };
  const hidden = Math.max(read.mainValue ?? 0, read.minusValue ?? 0) > absorbanceLimit;
  if (hidden && read.value <= absorbanceLimit)
    return { ...from, value: null, gapReason: 'aboveRange', gapText: `>${absorbanceLimit}` };
  return { ...from, value: read.value, gapReason: null, gapText: null };
}

/** The engine knows a gap by its text; words of ours for "above range" become the one it knows. */
function textOfGap({ gapReason, gapText }: SpectrumReadingView): string {
  if (gapReason === 'aboveRange') return /\d|over/i.test(gapText ?? '') ? (gapText ?? 'OVER') : 'OVER';
  return gapText ?? '';
}

/** Read the chosen spectra by the rule of the batch's method. @throws AppError INVALID_INPUT naming the spectrum */
export async function samplesFromSpectra(
  actor: Actor,
  batch: BatchRow,
  samples: AddSpectrumSamples['samples'],
): Promise<NewSample[]> {
  const method = await methodOfCurve(actor, batch.curveId);
  const ids = samples.flatMap((sample) => sample.spectrumIds);
  if (new Set(ids).size < ids.length)
    throw new AppError('INVALID_INPUT', 'A spectrum stands in two samples. Leave it in one of them');
  const read = await readingsFromSpectra(actor, batch.notebookId, ids, method.readingRule);
  const byId = new Map(read.map((one) => [one.spectrumId, one]));
  return samples.map(({ spectrumIds, ...sample }, index) => ({
    ...sample,
    readings: spectrumIds.map((id) => {
      const one = byId.get(id);
      if (!one || one.error !== undefined) {
        const detail = `${one?.name ?? 'A spectrum'} cannot be read: ${one?.error ?? 'it is not there'}`;
        throw new AppError('INVALID_INPUT', detail, [{ pointer: `/samples.${index}.spectrumIds`, detail }]);
      }
      return readingOf(one, method.readingRule, method.absorbanceLimit);
    }),
  }));
}
