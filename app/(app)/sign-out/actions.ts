'use server';

import { redirect } from 'next/navigation';
import { z } from 'zod';
import { signOut as endSession } from '@/db/entry/sign-in';
import { action } from '@/app/_server/action';
import { forgetSession } from '@/app/_server/begin-session';

export const signOut = action(z.object({}), async (actor) => {
  if (actor.sessionId) await endSession(actor.sessionId);
  await forgetSession();
  redirect('/sign-in');
});
