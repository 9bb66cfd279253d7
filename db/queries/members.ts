import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import type { NewMember } from '@/lib/schemas/notebook';
import type { MemberView, PersonName } from '@/lib/views/notebook';
import { changeFor, createFor, listFor, loadFor } from '../access';
import { activePeople, namesOf } from '../names';
import { inTransaction } from '../sequelize';

/** @throws AppError NOT_FOUND */
export async function listMembers(actor: Actor, notebookId: string): Promise<MemberView[]> {
  const rows = await listFor(actor, 'membership', notebookId, {
    where: { endedAt: null },
    order: [['createdAt', 'ASC']],
  });
  const names = await namesOf(rows.map((row) => row.personId));
  return rows.map((row) => ({
    id: row.id,
    personId: row.personId,
    name: names.get(row.personId) ?? 'unknown',
    role: row.role,
    since: row.createdAt.toISOString(),
  }));
}

/** Who could still be added. @throws AppError NOT_FOUND, NOT_ALLOWED */
export async function possibleMembers(actor: Actor, notebookId: string): Promise<PersonName[]> {
  const notebook = await loadFor(actor, 'notebook', 'manage', notebookId);
  const taken = new Set((await listMembers(actor, notebookId)).map((member) => member.personId));
  const people = await activePeople(['pi', 'analyst', 'viewer', 'administrator']);
  return people.filter((person) => person.id !== notebook.ownerId && !taken.has(person.id));
}

/** @throws AppError NOT_FOUND, NOT_ALLOWED, INVALID_INPUT, CONFLICT */
export function addMember(actor: Actor, { notebookId, personId, role }: NewMember): Promise<void> {
  return inTransaction(async () => {
    const person = (await possibleMembers(actor, notebookId)).find(({ id }) => id === personId);
    if (!person)
      throw new AppError('CONFLICT', 'This person is in the notebook already, or cannot be added', [
        { pointer: '/personId', detail: 'Choose somebody else' },
      ]);
    if (person.role === 'viewer' && role === 'contributor')
      throw new AppError('INVALID_INPUT', 'A viewer reads only', [
        { pointer: '/role', detail: `${person.name} is a viewer and can be a reader here` },
      ]);
    await createFor(actor, 'membership', { notebookId, personId, role });
  });
}

/** End a membership; it acts at the person's next request. @throws AppError NOT_FOUND, NOT_ALLOWED */
export function endMembership(actor: Actor, membershipId: string): Promise<void> {
  return inTransaction(async () => {
    const row = await loadFor(actor, 'membership', 'edit', membershipId);
    await changeFor(actor, row, { endedAt: new Date() });
  });
}
