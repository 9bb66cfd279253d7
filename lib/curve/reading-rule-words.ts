import type { ReadingRule } from '@/lib/engine';

/** "A510", "mean of 505 to 515 nm", with "minus A700" when a second wavelength is taken off. */
export function readingRuleWords(rule: ReadingRule): string {
  const minus = rule.minusNm === undefined ? '' : ` minus the reading at ${rule.minusNm} nm`;
  const at = rule.wavelengthNm ?? NaN;
  switch (rule.kind) {
    case 'point':
      return `at the point ${at} nm${minus}`;
    case 'interpolated':
      return `interpolated at ${at} nm${minus}`;
    case 'bandMean':
      return `mean of ${at} ± ${rule.halfWidthNm ?? NaN} nm${minus}`;
    case 'windowMaximum':
      return `maximum between ${rule.fromNm ?? NaN} and ${rule.toNm ?? NaN} nm${minus}`;
  }
}

/** The wavelength that stands for a rule in titles and lists: the middle of a window. */
export function wavelengthOf(rule: ReadingRule): number {
  return rule.wavelengthNm ?? ((rule.fromNm ?? NaN) + (rule.toNm ?? NaN)) / 2;
}
