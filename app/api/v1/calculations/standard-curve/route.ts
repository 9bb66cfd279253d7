import { route } from '@/app/_server/route';
import { calculateStandardCurve } from '@/lib/engine';
import { standardCurveCalculation } from '@/lib/schemas/calculation';

/** Calculates and keeps nothing. */
export const POST = route({ body: standardCurveCalculation }, async (_actor, { body }) =>
  calculateStandardCurve(body),
);
