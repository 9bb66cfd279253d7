'use server';

import { redirect } from 'next/navigation';
import { createBatchVersion } from '@/db/queries/batch-versions';
import { newBatchVersion } from '@/lib/schemas/batch';
import { action } from '@/app/_server/action';

export const makeVersion = action(newBatchVersion, async (actor, input) => {
  const { id, notebookId } = await createBatchVersion(actor, input);
  redirect(`/notebooks/${notebookId}/batches/${id}`);
});
