'use server';

import { redirect } from 'next/navigation';
import { setPasswordByLink } from '@/db/entry/password-links';
import { passwordByLink } from '@/lib/schemas/password';
import { openAction } from '@/app/_server/action';
import { beginSession } from '@/app/_server/begin-session';

export const setPassword = openAction(passwordByLink, async ({ token, password }) => {
  redirect(await beginSession(await setPasswordByLink(token, password)));
});
