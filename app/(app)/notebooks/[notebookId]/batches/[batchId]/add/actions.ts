'use server';

import { redirect } from 'next/navigation';
import { addSpectrumSamples, addTypedSamples } from '@/db/queries/determinations';
import {
  addSpectrumSamples as spectrumSchema,
  addTypedSamples as typedSchema,
} from '@/lib/schemas/determination';
import { action } from '@/app/_server/action';

export const addTyped = action(typedSchema, async (actor, input) => {
  const { notebookId } = await addTypedSamples(actor, input);
  redirect(`/notebooks/${notebookId}/batches/${input.batchId}`);
});

export const addFromSpectra = action(spectrumSchema, async (actor, input) => {
  const { notebookId } = await addSpectrumSamples(actor, input);
  redirect(`/notebooks/${notebookId}/batches/${input.batchId}`);
});
