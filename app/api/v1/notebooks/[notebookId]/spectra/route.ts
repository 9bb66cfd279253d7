import { pageOfSpectra } from '@/db/queries/spectra';
import { notebookParams } from '@/lib/schemas/notebook';
import { spectraQuery } from '@/lib/schemas/spectrum';
import { route } from '@/app/_server/route';

export const GET = route({ params: notebookParams, query: spectraQuery }, (actor, { params, query }) => {
  const { voided, ...rest } = query;
  return pageOfSpectra(actor, params.notebookId, { ...rest, includeVoided: voided === 'include' });
});
