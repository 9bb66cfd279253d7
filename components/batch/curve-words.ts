import { YARDSTICK_NOUN } from '@/lib/batch/read-on';
import type { Yardstick } from '@/lib/batch/yardstick';
import type { YardstickView } from '@/lib/views/batch';

/** What a person should know of the curve or absorptivity before relying on it; null for the newest saved version. */
export function curveWords(
  { title, version, status, voidReason, newer }: YardstickView,
  kind: Yardstick['kind'] = 'curve',
): string | null {
  const named = `“${title}” version ${version}`;
  if (status === 'void') return `${named} was declared void: ${voidReason ?? 'no reason given'}.`;
  if (newer)
    return `${named} is not the newest: version ${newer.version} of this ${YARDSTICK_NOUN[kind]} was saved after it.`;
  if (status === 'superseded') return `${named} was superseded, and no newer version is in use.`;
  return null;
}
