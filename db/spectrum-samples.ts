import type { ReadingRule } from '@/lib/engine';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { AddSpectrumSamples } from '@/lib/schemas/determination';
import { keptReading } from '@/lib/spectrum/kept-reading';
import type { SpectrumReadingView } from '@/lib/views/spectrum';
import { readingRuleOf } from './batch-method';
import type { NewReading, NewSample } from './determination-rows';
import type { BatchRow } from './models/batches';
import { readingsFromSpectra } from './queries/spectra';

/** What was read off a spectrum by a rule, as a reading to keep. */
export function readingOf(read: SpectrumReadingView, rule: ReadingRule): NewReading {
  const from = { signal: 'absorbance', origin: 'spectrum', spectrumId: read.spectrumId, rule } as const;
  return { ...keptReading(read), ...from };
}

/** Read the chosen spectra by the rule of the batch. @throws AppError INVALID_INPUT naming the spectrum */
export async function samplesFromSpectra(
  actor: Actor,
  batch: BatchRow,
  samples: AddSpectrumSamples['samples'],
): Promise<NewSample[]> {
  const rule = await readingRuleOf(actor, batch);
  const ids = samples.flatMap((sample) => sample.spectrumIds);
  if (new Set(ids).size < ids.length)
    throw new AppError('INVALID_INPUT', 'A spectrum stands in two samples. Leave it in one of them');
  const read = await readingsFromSpectra(actor, batch.notebookId, ids, rule);
  const byId = new Map(read.map((one) => [one.spectrumId, one]));
  return samples.map(({ spectrumIds, ...sample }, index) => ({
    ...sample,
    readings: spectrumIds.map((id) => {
      const one = byId.get(id);
      if (!one || one.error !== undefined) {
        const detail = `${one?.name ?? 'A spectrum'} cannot be read: ${one?.error ?? 'it is not there'}`;
        throw new AppError('INVALID_INPUT', detail, [{ pointer: `/samples.${index}.spectrumIds`, detail }]);
      }
      return readingOf(one, rule);
    }),
  }));
}
