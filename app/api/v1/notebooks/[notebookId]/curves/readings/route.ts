import { route } from '@/app/_server/route';
import { readingsFromSpectra } from '@/db/queries/spectra';
import { readingsPreview } from '@/lib/schemas/curve';
import { notebookParams } from '@/lib/schemas/notebook';

/** What a rule reads off some spectra, before anything is saved; saving reads them again. */
export const POST = route(
  { params: notebookParams, body: readingsPreview },
  async (actor, { params, body }) => ({
    items: await readingsFromSpectra(actor, params.notebookId, body.spectrumIds, body.rule),
  }),
);
