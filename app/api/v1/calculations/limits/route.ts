import { route } from '@/app/_server/route';
import { allLimits } from '@/lib/engine';
import { limitsCalculation } from '@/lib/schemas/limits-calculation';

/** Calculates and keeps nothing. */
export const POST = route({ body: limitsCalculation }, async (_actor, { body }) => allLimits(body));
