'use server';

import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { signIn as enter } from '@/db/entry/sign-in';
import { signInForm } from '@/lib/schemas/account';
import { openAction } from '@/app/_server/action';
import { beginSession } from '@/app/_server/begin-session';

export const signIn = openAction(signInForm, async (input) => {
  const signedIn = await enter(input, (await headers()).get('x-forwarded-for'));
  redirect(await beginSession(signedIn));
});
