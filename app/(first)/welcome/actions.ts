'use server';

import { redirect } from 'next/navigation';
import { confirmReading } from '@/db/queries/account';
import { nothing } from '@/lib/schemas/account';
import { action } from '@/app/_server/action';

export const confirm = action(nothing, async (actor) => {
  await confirmReading(actor);
  redirect('/notebooks');
});
