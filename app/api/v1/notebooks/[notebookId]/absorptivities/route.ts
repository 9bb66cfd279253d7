import { pageOfAbsorptivities } from '@/db/queries/absorptivities';
import { notebookParams } from '@/lib/schemas/notebook';
import { pageQuery } from '@/lib/schemas/page-query';
import { route } from '@/app/_server/route';

export const GET = route({ params: notebookParams, query: pageQuery }, (actor, { params, query }) =>
  pageOfAbsorptivities(actor, params.notebookId, query),
);
