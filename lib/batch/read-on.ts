import type { BatchSummary, YardstickView } from '@/lib/views/batch';
import type { Yardstick } from './yardstick';

/** What a batch is read on, whichever of the two it is. */
export interface ReadOn extends YardstickView {
  readonly kind: Yardstick['kind'];
}

/** What each kind is called in a sentence. */
export const YARDSTICK_NOUN: Readonly<Record<Yardstick['kind'], string>> = {
  curve: 'curve',
  absorptivity: 'absorptivity',
};

export function readOn({ curve, absorptivity }: Pick<BatchSummary, 'curve' | 'absorptivity'>): ReadOn {
  if (curve) return { kind: 'curve', ...curve };
  if (absorptivity) return { kind: 'absorptivity', ...absorptivity };
  throw new Error('a batch is read on a curve or on a known absorptivity');
}

/** Where it is shown, under the address of its notebook. */
export function readOnHref({ kind, id }: Pick<ReadOn, 'kind' | 'id'>, base: string): string {
  return `${base}/${kind === 'curve' ? 'curves' : 'absorptivities'}/${id}`;
}

/** “Iron, 510 nm” version 2. */
export const readOnText = ({ title, version }: Pick<ReadOn, 'title' | 'version'>): string =>
  `“${title}” version ${version}`;
