'use server';

import { redirect } from 'next/navigation';
import { setUp as makeLaboratory } from '@/db/entry/set-up';
import { setUpForm } from '@/lib/schemas/account';
import { openAction } from '@/app/_server/action';
import { beginSession } from '@/app/_server/begin-session';

export const setUp = openAction(setUpForm, async (input) => {
  redirect(await beginSession(await makeLaboratory(input)));
});
