'use server';

import { refresh } from 'next/cache';
import { voidBatch } from '@/db/queries/batches';
import { voidBatch as voidSchema } from '@/lib/schemas/batch';
import { action } from '@/app/_server/action';

export const declareVoid = action(voidSchema, async (actor, input) => {
  await voidBatch(actor, input);
  refresh();
  return { status: 'done' };
});
