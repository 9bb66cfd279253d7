import { Op, type WhereOptions } from 'sequelize';
import { AppError } from '@/lib/errors';
import type { Page, PageQuery } from '@/lib/schemas/page-query';

interface Placed {
  readonly id: string;
  readonly createdAt: Date;
}

function encode(row: Placed): string {
  return Buffer.from(`${row.createdAt.toISOString()} ${row.id}`).toString('base64url');
}

function decode(cursor: string): { at: Date; id: string } {
  const [moment = '', id = ''] = Buffer.from(cursor, 'base64url').toString().split(' ');
  const at = new Date(moment);
  if (Number.isNaN(at.getTime()) || id === '')
    throw new AppError('INVALID_INPUT', 'This cursor is not one of ours', [
      { pointer: '/cursor', detail: 'Take nextCursor of the page before' },
    ]);
  return { at, id };
}

/**
 * One page, newest first. `list` gets the condition, order and limit to add to its own; a page stays the
 * same while new rows arrive above it.
 */
export async function pageOf<R extends Placed, V>(
  { cursor, limit }: PageQuery,
  list: (part: { where: WhereOptions; order: [string, string][]; limit: number }) => Promise<R[]>,
  view: (row: R) => V,
): Promise<Page<V>> {
  const from = cursor === undefined ? null : decode(cursor);
  const where = from
    ? { [Op.or]: [{ createdAt: { [Op.lt]: from.at } }, { createdAt: from.at, id: { [Op.lt]: from.id } }] }
    : {};
  const order: [string, string][] = [
    ['createdAt', 'DESC'],
    ['id', 'DESC'],
  ];
  const rows = await list({ where, order, limit: limit + 1 });
  const last = rows.length > limit ? rows[limit - 1] : undefined;
  return { items: rows.slice(0, limit).map(view), nextCursor: last ? encode(last) : null };
}
