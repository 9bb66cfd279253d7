import {
  getRawPoints,
  getSpectrum,
  getSpectrumPoints,
  renameSpectrum,
  setSpectrumAside,
} from '@/db/queries/spectra';
import { spectrumChange, spectrumParams, spectrumQuery } from '@/lib/schemas/spectrum';
import { route } from '@/app/_server/route';

/** What is known of a spectrum, with its points: nm ascending and absorbance, or with ?raw=1 as in the file. */
export const GET = route(
  { params: spectrumParams, query: spectrumQuery },
  async (actor, { params: { spectrumId }, query }) => ({
    ...(await getSpectrum(actor, spectrumId)),
    points: await (query.raw === '1' ? getRawPoints : getSpectrumPoints)(actor, spectrumId),
  }),
);

export const PATCH = route(
  { params: spectrumParams, body: spectrumChange },
  (actor, { params: { spectrumId }, body }) =>
    'name' in body
      ? renameSpectrum(actor, spectrumId, body.name)
      : setSpectrumAside(actor, spectrumId, body.voided, body.reason),
);
