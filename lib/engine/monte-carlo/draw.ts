import type { Spread } from '../uncertainty/spread';
import type { Random } from './random';

/** One error drawn from its declared spread, about zero. */
export function drawSpread(spread: Spread, random: Random): number {
  switch (spread.shape) {
    case 'normal':
      return spread.u * random.normal();
    case 'rectangular':
      return spread.halfWidth * (2 * random.uniform() - 1);
    case 'triangular':
      return spread.halfWidth * (random.uniform() - random.uniform());
    case 't':
      return (
        spread.u *
        random.normal() *
        Math.sqrt(spread.degreesOfFreedom / random.chiSquare(spread.degreesOfFreedom))
      );
  }
}

/** The sum of independent errors. */
export function drawAll(spreads: readonly Spread[], random: Random): number {
  let sum = 0;
  for (let i = 0; i < spreads.length; i += 1) sum += drawSpread(spreads[i] as Spread, random);
  return sum;
}
