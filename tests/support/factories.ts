import { createFor } from '@/db/access';
import { actorForPerson, openSession, actorFromSession, systemActor } from '@/db/actors';
import { inTransaction } from '@/db/sequelize';
import type { Actor, MemberRole, Role } from '@/lib/policies/actor';

let count = 0;

/** A person of the laboratory; the actor comes through a session unless said. */
export async function makePerson(
  role: Role,
  name = `Person ${(count += 1)}`,
): Promise<{ id: string; name: string }> {
  count += 1;
  const row = await inTransaction(() =>
    createFor(systemActor(), 'person', { name, email: `p${count}@example.test`, role, passwordHash: null }),
  );
  return { id: row.id, name };
}

/** The actor of a person as a browser session gives it. Memberships are as of this moment. */
export async function actorOf(personId: string): Promise<Actor> {
  const actor = await actorFromSession(await openSession(personId));
  if (!actor) throw new Error('the session just opened gave no actor');
  return actor;
}

export async function makeActor(role: Role, name?: string): Promise<Actor> {
  return actorOf((await makePerson(role, name)).id);
}

/** A notebook with its owner. */
export async function makeNotebook(ownerId: string, title = 'Test notebook'): Promise<string> {
  const owner = await actorForPerson(ownerId);
  const row = await inTransaction(() =>
    createFor(owner, 'notebook', { title, purpose: '', ownerId, createdById: ownerId }),
  );
  return row.id;
}

export async function makeMember(notebookId: string, personId: string, role: MemberRole): Promise<void> {
  await inTransaction(() => createFor(systemActor(), 'membership', { notebookId, personId, role }));
}
