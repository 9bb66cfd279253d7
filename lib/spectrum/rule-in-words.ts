import type { ReadingRule } from '@/lib/engine';
import { nmText } from '@/lib/format/optical';

const nm = (value: number | undefined) => (value === undefined ? '?' : nmText(value));

/** A reading rule as a title: "Mean of 510 ± 2 nm, minus 700 nm". */
export function ruleInWords(rule: ReadingRule): string {
  const minus = rule.minusNm === undefined ? '' : `, minus ${nm(rule.minusNm)} nm`;
  switch (rule.kind) {
    case 'interpolated':
      return `Read at ${nm(rule.wavelengthNm)} nm${minus}`;
    case 'point':
      return `Nearest point to ${nm(rule.wavelengthNm)} nm${minus}`;
    case 'bandMean':
      return `Mean of ${nm(rule.wavelengthNm)} ± ${nm(rule.halfWidthNm)} nm${minus}`;
    case 'windowMaximum':
      return `Maximum in ${nm(rule.fromNm)}\u2013${nm(rule.toNm)} nm${minus}`;
  }
}
