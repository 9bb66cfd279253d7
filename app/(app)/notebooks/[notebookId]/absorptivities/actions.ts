'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { saveAbsorptivity, voidAbsorptivity } from '@/db/queries/absorptivities';
import { saveAbsorptivityForm, voidAbsorptivityForm } from '@/lib/schemas/absorptivity';
import { action } from '@/app/_server/action';

export const save = action(saveAbsorptivityForm, async (actor, input) => {
  const { id } = await saveAbsorptivity(actor, input);
  redirect(`/notebooks/${input.notebookId}/absorptivities/${id}`);
});

export const declareVoid = action(voidAbsorptivityForm, async (actor, input) => {
  const { notebookId } = await voidAbsorptivity(actor, input);
  revalidatePath(`/notebooks/${notebookId}`, 'layout');
  return { status: 'done' };
});
