import { listDeterminations } from '@/db/queries/determinations';
import { batchParams } from '@/lib/schemas/batch';
import { pageQuery } from '@/lib/schemas/page-query';
import { route } from '@/app/_server/route';

export const GET = route({ params: batchParams, query: pageQuery }, (actor, { params, query }) =>
  listDeterminations(actor, params.batchId, query),
);
