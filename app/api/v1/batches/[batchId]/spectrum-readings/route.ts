import { readSpectraForBatch } from '@/db/queries/determinations';
import { batchParams, spectrumReadingsQuery } from '@/lib/schemas/batch';
import { route } from '@/app/_server/route';

/** What spectra of the notebook read by the rule of the batch's method; nothing is saved. */
export const GET = route(
  { params: batchParams, query: spectrumReadingsQuery },
  async (actor, { params, query }) => ({
    items: await readSpectraForBatch(actor, params.batchId, query.spectra),
  }),
);
