'use server';

import { revalidatePath } from 'next/cache';
import { addMember, endMembership } from '@/db/queries/members';
import { makeShareLink, revokeShareLink } from '@/db/queries/share-links';
import { memberEnd, newMember, newShareLink, shareLinkEnd } from '@/lib/schemas/notebook';
import { action } from '@/app/_server/action';

const PAGE = '/notebooks/[notebookId]/members';

export const add = action(newMember, async (actor, input) => {
  await addMember(actor, input);
  revalidatePath(PAGE, 'page');
  return { status: 'done', message: 'Added. It acts from their next click on.' };
});

export const remove = action(memberEnd, async (actor, { membershipId }) => {
  await endMembership(actor, membershipId);
  revalidatePath(PAGE, 'page');
  return { status: 'done', message: 'Removed. It acts from their next click on.' };
});

/** The address stands in the answer once and nowhere else: only its hash is stored. */
export const share = action(newShareLink, async (actor, input) => {
  const { address } = await makeShareLink(actor, input);
  revalidatePath(PAGE, 'page');
  return { status: 'done', message: address };
});

export const revoke = action(shareLinkEnd, async (actor, { shareLinkId }) => {
  await revokeShareLink(actor, shareLinkId);
  revalidatePath(PAGE, 'page');
  return { status: 'done', message: 'Withdrawn. The link opens nothing any more.' };
});
