import { manySpectrumPoints } from '@/db/queries/spectra';
import { manySpectraQuery } from '@/lib/schemas/spectrum';
import { route } from '@/app/_server/route';

/** The points of several spectra for one plot: ?ids=…,… */
export const GET = route({ query: manySpectraQuery }, async (actor, { query }) => ({
  items: await manySpectrumPoints(actor, query.ids),
}));
