'use server';

import { redirect } from 'next/navigation';
import { createNotebook } from '@/db/queries/notebooks';
import { newNotebook } from '@/lib/schemas/notebook';
import { action } from '@/app/_server/action';

export const create = action(newNotebook, async (actor, input) => {
  const { id } = await createNotebook(actor, input);
  redirect(`/notebooks/${id}`);
});
