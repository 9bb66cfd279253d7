import { Op } from 'sequelize';
import type { Role } from '@/lib/policies/actor';
import type { PersonName } from '@/lib/views/notebook';
import { db } from './sequelize';

/*
 * Names of people, and nothing else of them: whoever reads a notebook reads who owns it and who made what.
 * Callers have opened the notebook first.
 */

export async function namesOf(ids: readonly (string | null)[]): Promise<ReadonlyMap<string, string>> {
  const wanted = [...new Set(ids.filter((id) => id !== null))];
  const rows = await db().Person.findAll({ where: { id: wanted }, attributes: ['id', 'name'] });
  return new Map(rows.map((row) => [row.id, row.name]));
}

/** Everybody who may be named as an owner or a member. */
export async function activePeople(roles: readonly Role[]): Promise<PersonName[]> {
  const rows = await db().Person.findAll({
    where: { active: true, role: { [Op.in]: [...roles] } },
    attributes: ['id', 'name', 'role'],
    order: [['name', 'ASC']],
  });
  return rows.map(({ id, name, role }) => ({ id, name, role }));
}
