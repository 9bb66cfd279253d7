import { z } from 'zod';
import { LIMITS } from '@/lib/limits';

/** Query of every list of the API: how many, and where the page before ended. */
export const pageQuery = z.object({
  cursor: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(LIMITS.pageSize).default(50),
});
export type PageQuery = z.infer<typeof pageQuery>;

/** One page of a list; `nextCursor` is null on the last one. */
export interface Page<T> {
  readonly items: readonly T[];
  readonly nextCursor: string | null;
}
