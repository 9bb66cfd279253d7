import { route } from '@/app/_server/route';
import { resultFromKnownAbsorptivity } from '@/lib/engine';
import { knownAbsorptivityCalculation } from '@/lib/schemas/known-absorptivity';

/** Calculates and keeps nothing. */
export const POST = route({ body: knownAbsorptivityCalculation }, async (_actor, { body }) =>
  resultFromKnownAbsorptivity(body),
);
