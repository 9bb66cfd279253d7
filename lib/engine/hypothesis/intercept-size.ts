import { significantText } from '../../format/round';
import type { FittedCurve } from '../fit-curve';
import { coefficientOf } from '../regression/fit';
import type { InterceptSize } from '../types';

/**
 * Is the intercept small beside what is to be measured? |a| / b, the concentration it stands for, against half the
 * lowest standard. Beside the t test, which only says whether the intercept can be told from zero: an intercept known
 * well can differ from zero and not matter, one known badly can matter and pass. Null for a line through zero.
 *
 * @source EPA method 8000D, in our own words
 */
export function interceptSize({ fit, range, request }: FittedCurve): InterceptSize | null {
  if (fit.model === 'proportional') return null;
  const asConcentration = Math.abs(coefficientOf(fit, 0).value / coefficientOf(fit, 1).value);
  const halfLowest = range.min / 2;
  const passed = asConcentration <= halfLowest;
  const text = (value: number) => `${significantText(value, 3)} ${request.unit}`;
  const verdict = `The intercept stands for ${text(asConcentration)}, ${passed ? 'no more' : 'more'} than half the lowest standard (${text(halfLowest)}).`;
  return { asConcentration, halfLowest, passed, verdict };
}
