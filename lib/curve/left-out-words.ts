import { effectOfLeavingOut, type CurveRequest, type CurveResult, type LeftOut } from '@/lib/engine';
import { formatNumber, formatPercent } from '@/lib/format/number';
import type { StoredStandard } from './stored-curve';

/** What leaving out each standard and each of its readings would change; nothing for a blank. */
export function effectsOn(
  request: CurveRequest,
  standards: readonly StoredStandard[],
  index: number,
): readonly LeftOut[] {
  if (standards[index]?.role !== 'standard') return [];
  const place = standards.slice(0, index).filter(({ role }) => role === 'standard').length;
  return effectOfLeavingOut(request).filter(({ standardIndex }) => standardIndex === place);
}

const plain = (value: number) => String(Number(value.toPrecision(6)));

/** "Without it the slope changes by -0.4 % to 0.1973 ...": the effect, said before it is done. */
export function leftOutWords(effect: LeftOut, curve: CurveResult): string {
  if (effect.reason !== undefined) return `Without it there is no curve: ${effect.reason}.`;
  const { slope, slopeChangePercent, residualSd, range } = effect;
  const changed =
    slopeChangePercent > 0
      ? `+${formatPercent(slopeChangePercent, 2)}`
      : formatPercent(slopeChangePercent, 2);
  const narrower = range.min !== curve.range.min || range.max !== curve.range.max;
  const covers = narrower
    ? ` The curve would cover ${plain(range.min)} to ${plain(range.max)} ${curve.unit} only.`
    : ' The range stays.';
  return `Without it the slope is ${formatNumber(slope, 4)} (${changed}), the residual SD ${formatNumber(residualSd, 2)} instead of ${formatNumber(curve.residualSd, 2)}.${covers}`;
}
