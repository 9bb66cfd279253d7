import { loadAbsorptivity } from '@/db/queries/absorptivities';
import { absorptivityParams } from '@/lib/schemas/absorptivity';
import { route } from '@/app/_server/route';

export const GET = route({ params: absorptivityParams }, (actor, { params }) =>
  loadAbsorptivity(actor, params.absorptivityId),
);
