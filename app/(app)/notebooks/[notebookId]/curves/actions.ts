'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { action } from '@/app/_server/action';
import { voidCurve } from '@/db/queries/curves';
import { saveCurve } from '@/db/queries/curve-saving';
import { saveCurveForm, voidCurveForm } from '@/lib/schemas/curve';

export const save = action(saveCurveForm, async (actor, input) => {
  const { id } = await saveCurve(actor, input);
  revalidatePath(`/notebooks/${input.notebookId}`, 'layout'); // its tabs count curves
  redirect(`/notebooks/${input.notebookId}/curves/${id}`);
});

export const declareVoid = action(voidCurveForm, async (actor, input) => {
  const { notebookId } = await voidCurve(actor, input);
  revalidatePath(`/notebooks/${notebookId}`, 'layout');
  return { status: 'done', message: 'This version is void now. It stays here with your reason' };
});
