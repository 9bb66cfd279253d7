import { readingsFromSpectra } from '@/db/queries/spectra';
import { notebookParams } from '@/lib/schemas/notebook';
import { readingsQuery } from '@/lib/schemas/spectrum';
import { route } from '@/app/_server/route';

/** One absorbance off each of ?ids=…,… by one rule (rule, at, half, from, to, minus). */
export const GET = route(
  { params: notebookParams, query: readingsQuery },
  async (actor, { params, query }) => ({
    items: await readingsFromSpectra(actor, params.notebookId, query.ids, query.rule),
  }),
);
