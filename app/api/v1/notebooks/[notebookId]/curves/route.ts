import { route } from '@/app/_server/route';
import { pageOfCurves } from '@/db/queries/curves';
import { notebookParams } from '@/lib/schemas/notebook';
import { pageQuery } from '@/lib/schemas/page-query';

export const GET = route({ params: notebookParams, query: pageQuery }, (actor, { params, query }) =>
  pageOfCurves(actor, params.notebookId, query),
);
