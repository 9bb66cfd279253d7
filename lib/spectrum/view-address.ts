import { LIMITS } from '@/lib/limits';
import { RULE_KINDS, type RuleKind, type RuleTexts } from '@/lib/schemas/spectrum-rule';

/*
 * The view of the Spectra page as it stands in its address, so that a link shows the same: which spectra (s), how
 * they are read (rule, at, half, from, to, minus), and whether those set aside are listed too (aside).
 */

const KEY_LENGTH = 12;
/** Without any choice of one's own: few enough to tell apart. */
const CHOSEN_AT_FIRST = 24;

/** The beginning of an id, long enough to tell 10,000 spectra apart; whole ids would make the address too long. */
export function spectrumKey(id: string): string {
  return id.replaceAll('-', '').slice(0, KEY_LENGTH);
}

export interface SpectraView {
  /** Keys of the chosen spectra; null while nobody has chosen. */
  readonly keys: readonly string[] | null;
  readonly texts: RuleTexts;
  readonly aside: boolean;
}

const isKind = (text: string): text is RuleKind => (RULE_KINDS as readonly string[]).includes(text);

export function readViewAddress(search: { get(name: string): string | null }): SpectraView {
  const text = (name: string) => (search.get(name) ?? '').slice(0, 30);
  const rule = text('rule');
  const chosen = search.get('s');
  return {
    keys:
      chosen === null
        ? null
        : chosen
            .split(',')
            .filter((key) => key !== '')
            .slice(0, LIMITS.spectraAtOnce),
    texts: {
      rule: isKind(rule) ? rule : 'interpolated',
      at: text('at'),
      half: text('half'),
      from: text('from'),
      to: text('to'),
      minus: text('minus'),
    },
    aside: search.get('aside') === '1',
  };
}

const USED: Record<RuleKind, readonly (keyof RuleTexts)[]> = {
  interpolated: ['at'],
  point: ['at'],
  bandMean: ['at', 'half'],
  windowMaximum: ['from', 'to'],
};

/** The address of a view; what its rule does not use is left out. */
export function writeViewAddress({ keys, texts, aside }: SpectraView): string {
  const search = new URLSearchParams();
  if (keys !== null) search.set('s', keys.join(','));
  search.set('rule', texts.rule);
  for (const name of [...USED[texts.rule], 'minus'] as const) {
    const text = texts[name].trim();
    if (text !== '') search.set(name, text);
  }
  if (aside) search.set('aside', '1');
  return `?${search.toString().replaceAll('%2C', ',')}`;
}

interface Choosable {
  readonly id: string;
  readonly voided: boolean;
}

/** The chosen spectra in the order of the list; without a choice the first of those in use. */
export function chosenSpectra<S extends Choosable>(
  spectra: readonly S[],
  keys: readonly string[] | null,
): S[] {
  if (keys === null) return spectra.filter((spectrum) => !spectrum.voided).slice(0, CHOSEN_AT_FIRST);
  const wanted = new Set(keys);
  return spectra.filter((spectrum) => wanted.has(spectrumKey(spectrum.id)));
}
