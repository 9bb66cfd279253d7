'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import {
  addPerson,
  changePerson,
  makePasswordLink,
  setPersonActive,
  withdrawPasswordLink,
} from '@/db/queries/people';
import { changedPerson, onePerson, personAccess, personDetails } from '@/lib/schemas/people';
import { action } from '@/app/_server/action';

export const add = action(personDetails, async (actor, details) => {
  const { link } = await addPerson(actor, details);
  revalidatePath('/people');
  return { status: 'done', message: `${details.name} was added.`, shownOnce: link };
});

export const change = action(changedPerson, async (actor, { personId, ...details }) => {
  await changePerson(actor, personId, details);
  if (personId === actor.personId && details.role !== 'administrator') redirect('/account');
  revalidatePath('/people', 'layout');
  return { status: 'done', message: 'Saved. A changed role acts from their next click on.' };
});

export const makeLink = action(onePerson, async (actor, { personId }) => {
  const link = await makePasswordLink(actor, personId);
  revalidatePath('/people', 'layout');
  return { status: 'done', shownOnce: link };
});

export const withdrawLink = action(onePerson, async (actor, { personId }) => {
  await withdrawPasswordLink(actor, personId);
  revalidatePath('/people', 'layout');
  return { status: 'done', message: 'Withdrawn. The link sets no password any more.' };
});

export const setAccess = action(personAccess, async (actor, { personId, active, why }) => {
  await setPersonActive(actor, personId, active, why || undefined);
  revalidatePath('/people', 'layout');
  return {
    status: 'done',
    message: active
      ? 'Open again. They sign in with the password they had.'
      : 'Closed. Whatever they had open has ended.',
  };
});
