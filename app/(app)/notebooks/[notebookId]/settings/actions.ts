'use server';

import { redirect } from 'next/navigation';
import { archiveNotebook, changeNotebook } from '@/db/queries/notebooks';
import { notebookArchiving, notebookChange } from '@/lib/schemas/notebook';
import { action } from '@/app/_server/action';

export const change = action(notebookChange, async (actor, input) => {
  await changeNotebook(actor, input);
  redirect(`/notebooks/${input.id}`);
});

export const archive = action(notebookArchiving, async (actor, input) => {
  await archiveNotebook(actor, input);
  redirect(`/notebooks/${input.id}`);
});
