import { typedReading } from '@/lib/batch/typed-reading';
import type { ReadingRule, Signal } from '@/lib/engine';
import type { StandardDraft } from '@/lib/schemas/curve';
import type { SpectrumReadingView } from '@/lib/views/spectrum';
import { keptReading } from '@/lib/spectrum/kept-reading';
import type { StoredReading, StoredStandard } from './stored-curve';

/** Something in the draft that cannot be kept: where, with dots, and what to do. */
export interface DraftRefusal {
  readonly path: string;
  readonly message: string;
}

export type ReadSpectra = ReadonlyMap<string, SpectrumReadingView>;

export interface StandardsContext {
  readonly signal: Signal;
  readonly pathLengthMm: number;
  readonly rule: ReadingRule | null;
  readonly spectra: ReadSpectra;
}

type DraftReading = StandardDraft['readings'][number];
type KeptOrRefused = { readonly reading: StoredReading } | { readonly message: string };

function fromText(text: string, leftOut: string | null, { signal }: StandardsContext): KeptOrRefused {
  const typed = typedReading(text);
  if (!typed.ok) return { message: typed.message };
  const whence = { signal, origin: 'typed', spectrumId: null, rule: null } as const;
  return { reading: { ...typed.reading, ...whence, excludedReason: leftOut } };
}

function fromSpectrum(spectrumId: string, leftOut: string | null, context: StandardsContext): KeptOrRefused {
  const read = context.spectra.get(spectrumId);
  if (!read) return { message: 'This spectrum has not been read' };
  if (read.error !== undefined) return { message: `${read.name}: ${read.error}` };
  const whence = { signal: 'absorbance', origin: 'spectrum', spectrumId, rule: context.rule } as const;
  return { reading: { ...keptReading(read), ...whence, excludedReason: leftOut } };
}

const kept = (draft: DraftReading, context: StandardsContext) =>
  'text' in draft
    ? fromText(draft.text, draft.leftOut, context)
    : fromSpectrum(draft.spectrumId, draft.leftOut, context);

/** The standards of a draft as they are kept, or everything that stands in the way of it. */
export function storedStandards(
  drafts: readonly StandardDraft[],
  context: StandardsContext,
): { readonly standards: readonly StoredStandard[]; readonly refusals: readonly DraftRefusal[] } {
  const refusals: DraftRefusal[] = [];
  const standards = drafts.map((draft, index) => ({
    role: draft.role,
    name: draft.name,
    concentration: draft.concentration,
    pathLengthMm: context.pathLengthMm,
    excludedReason: draft.leftOut,
    readings: draft.readings.flatMap((reading, position) => {
      const answer = kept(reading, context);
      if ('reading' in answer) return [answer.reading];
      refusals.push({ path: `standards.${index}.readings.${position}`, message: answer.message });
      return [];
    }),
  }));
  return { standards, refusals };
}
