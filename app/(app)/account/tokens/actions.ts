'use server';

import { revalidatePath } from 'next/cache';
import { makeToken, revokeToken } from '@/db/queries/tokens';
import { newToken, oneToken } from '@/lib/schemas/account';
import { action } from '@/app/_server/action';

export const make = action(newToken, async (actor, input) => {
  const token = await makeToken(actor, input);
  revalidatePath('/account/tokens');
  return { status: 'done', shownOnce: token };
});

export const revoke = action(oneToken, async (actor, { id }) => {
  await revokeToken(actor, id);
  revalidatePath('/account/tokens');
  return { status: 'done' };
});
