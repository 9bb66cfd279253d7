import { createNotebook, pageOfNotebooks } from '@/db/queries/notebooks';
import { newNotebook } from '@/lib/schemas/notebook';
import { pageQuery } from '@/lib/schemas/page-query';
import { route } from '@/app/_server/route';

export const GET = route({ query: pageQuery }, (actor, { query }) => pageOfNotebooks(actor, query));

export const POST = route({ body: newNotebook, status: 201 }, (actor, { body }) =>
  createNotebook(actor, body),
);
