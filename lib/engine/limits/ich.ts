import type { LimitAnswer } from '../types';

/**
 * 3.3 σ/S and 10 σ/S. The σ differ (of the blank, of the residuals, of the intercept), so each is named.
 *
 * @source ICH Q2(R2), in our own words
 */
export function ichLimits(sd: number, slope: number, of: string): readonly LimitAnswer[] {
  const limit = (name: string, kind: 'detection' | 'quantification', factor: number): LimitAnswer => ({
    name,
    kind,
    value: (factor * sd) / slope,
    basis: `${factor} times ${of} over the slope`,
    formula: `${factor} * sigma / S`,
    alpha: null,
    beta: null,
    source: 'ICH Q2(R2)',
  });
  return [
    limit('ICH Q2 detection limit', 'detection', 3.3),
    limit('ICH Q2 quantitation limit', 'quantification', 10),
  ];
}
