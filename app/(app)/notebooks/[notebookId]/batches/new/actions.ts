'use server';

import { redirect } from 'next/navigation';
import { createBatch } from '@/db/queries/batches';
import { newBatch } from '@/lib/schemas/batch';
import { action } from '@/app/_server/action';

export const create = action(newBatch, async (actor, input) => {
  const { id } = await createBatch(actor, input);
  redirect(`/notebooks/${input.notebookId}/batches/${id}/add`);
});
