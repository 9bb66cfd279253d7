'use server';

import { revalidatePath } from 'next/cache';
import { renameSpectrum, setSpectrumAside } from '@/db/queries/spectra';
import { spectrumAside, spectrumName } from '@/lib/schemas/spectrum';
import { action } from '@/app/_server/action';

export const rename = action(spectrumName, async (actor, { id, name }) => {
  const { notebookId } = await renameSpectrum(actor, id, name);
  revalidatePath(`/notebooks/${notebookId}/spectra`, 'layout');
  return { status: 'done', message: 'Renamed' };
});

export const setAside = action(spectrumAside, async (actor, { id, aside, reason }) => {
  const { notebookId } = await setSpectrumAside(actor, id, aside === 'yes', reason);
  revalidatePath(`/notebooks/${notebookId}/spectra`, 'layout');
  return { status: 'done', message: aside === 'yes' ? 'Set aside' : 'Brought back' };
});
