'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { changeOwnName, changeOwnPassword } from '@/db/queries/account';
import { endAllSessions, endSession } from '@/db/queries/sessions';
import { nothing, oneSession, ownName } from '@/lib/schemas/account';
import { passwordChange } from '@/lib/schemas/password';
import { action } from '@/app/_server/action';
import { forgetSession } from '@/app/_server/begin-session';

export const rename = action(ownName, async (actor, { name }) => {
  await changeOwnName(actor, name);
  revalidatePath('/', 'layout');
  return { status: 'done', message: 'Saved.' };
});

export const changePassword = action(passwordChange, async (actor, input) => {
  await changeOwnPassword(actor, input.currentPassword, input.password);
  revalidatePath('/account');
  return { status: 'done', message: 'The new password is set. Everywhere else you were signed out.' };
});

export const endOne = action(oneSession, async (actor, { id }) => {
  await endSession(actor, id);
  revalidatePath('/account');
  return { status: 'done' };
});

export const signOutEverywhere = action(nothing, async (actor) => {
  await endAllSessions(actor);
  await forgetSession();
  redirect('/sign-in');
});
