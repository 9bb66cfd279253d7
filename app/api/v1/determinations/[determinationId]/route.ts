import { loadDetermination } from '@/db/queries/determinations';
import { determinationParams } from '@/lib/schemas/determination';
import { route } from '@/app/_server/route';

export const GET = route({ params: determinationParams }, (actor, { params }) =>
  loadDetermination(actor, params.determinationId),
);
