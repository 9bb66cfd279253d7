import type { AbsorptivityKind } from '@/lib/engine';

interface KindWords {
  /** As the choice in a form. */
  readonly name: string;
  readonly symbol: string;
  readonly unit: string;
}

/** What each kind of absorptivity is called, its symbol, and the unit its value stands in. */
export const ABSORPTIVITY_WORDS: Readonly<Record<AbsorptivityKind, KindWords>> = {
  molar: { name: 'molar absorptivity ε', symbol: 'ε', unit: 'L/(mol cm)' },
  percent: { name: 'absorbance of 1 % in 1 cm, E(1 %, 1 cm)', symbol: 'E(1 %, 1 cm)', unit: '100 mL/(g cm)' },
  specific: { name: 'specific absorptivity a', symbol: 'a', unit: 'L/(g cm)' },
};
