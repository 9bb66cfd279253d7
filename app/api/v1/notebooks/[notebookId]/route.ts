import { progressOf, readNotebook } from '@/db/queries/notebooks';
import { notebookParams } from '@/lib/schemas/notebook';
import { route } from '@/app/_server/route';

export const GET = route({ params: notebookParams }, async (actor, { params }) => ({
  ...(await readNotebook(actor, params.notebookId)),
  progress: await progressOf(actor, params.notebookId),
}));
