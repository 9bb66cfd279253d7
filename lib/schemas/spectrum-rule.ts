import { z } from 'zod';
import type { ReadingRule } from '@/lib/engine';
import { parseDecimal } from './decimal';

export const RULE_KINDS = ['interpolated', 'point', 'bandMean', 'windowMaximum'] as const;
export type RuleKind = (typeof RULE_KINDS)[number];

/**
 * A reading rule as it stands in an address, a query or a form: texts under short names.
 * rule: how it is read; at: wavelength or middle of the band; half: half-width of the band;
 * from, to: the window; minus: the second wavelength. All in nm.
 */
export interface RuleTexts {
  readonly rule: RuleKind;
  readonly at: string;
  readonly half: string;
  readonly from: string;
  readonly to: string;
  readonly minus: string;
}
type RuleField = Exclude<keyof RuleTexts, 'rule'>;

const LARGEST_NM = 100_000;

const text = z.string().max(30).default('');
const texts = z.object({
  rule: z.enum(RULE_KINDS).default('interpolated'),
  at: text,
  half: text,
  from: text,
  to: text,
  minus: text,
});

type Refuse = (field: RuleField, message: string) => void;

function wavelength(input: RuleTexts, field: RuleField, refuse: Refuse): number {
  const parsed = parseDecimal(input[field]);
  const message = !parsed.ok
    ? parsed.message
    : parsed.value > 0 && parsed.value <= LARGEST_NM
      ? null
      : 'Enter nanometres above zero';
  if (message !== null) refuse(field, message);
  return parsed.ok ? parsed.value : NaN;
}

function mainPart(input: RuleTexts, refuse: Refuse): ReadingRule {
  if (input.rule === 'windowMaximum') {
    const fromNm = wavelength(input, 'from', refuse);
    const toNm = wavelength(input, 'to', refuse);
    if (fromNm >= toNm) refuse('to', 'End the window above its beginning');
    return { kind: input.rule, fromNm, toNm };
  }
  const wavelengthNm = wavelength(input, 'at', refuse);
  if (input.rule !== 'bandMean') return { kind: input.rule, wavelengthNm };
  return { kind: input.rule, wavelengthNm, halfWidthNm: wavelength(input, 'half', refuse) };
}

/** The rule behind the texts; each text that does not fit comes back with its sentence. */
export const spectrumRule = texts.transform((input, context): ReadingRule => {
  let refused = false;
  const refuse: Refuse = (field, message) => {
    refused = true;
    context.addIssue({ code: 'custom', path: [field], message });
  };
  const main = mainPart(input, refuse);
  const minus = input.minus.trim() === '' ? {} : { minusNm: wavelength(input, 'minus', refuse) };
  return refused ? z.NEVER : { ...main, ...minus };
});

/** The texts of a rule, as they go into an address or start a form. */
export function textsOfRule(rule: ReadingRule): RuleTexts {
  const words = (value: number | undefined) => (value === undefined ? '' : String(value));
  return {
    rule: rule.kind,
    at: words(rule.wavelengthNm),
    half: words(rule.halfWidthNm),
    from: words(rule.fromNm),
    to: words(rule.toNm),
    minus: words(rule.minusNm),
  };
}
