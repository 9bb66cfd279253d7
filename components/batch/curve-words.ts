import type { BatchCurveView } from '@/lib/views/batch';

/** What a person should know of the curve before relying on it; null when it is the newest saved version. */
export function curveWords({ title, version, status, voidReason, newer }: BatchCurveView): string | null {
  const named = `“${title}” version ${version}`;
  if (status === 'void') return `${named} was declared void: ${voidReason ?? 'no reason given'}.`;
  if (newer) return `${named} is not the newest: version ${newer.version} of this curve was saved after it.`;
  if (status === 'superseded') return `${named} was superseded, and no newer version is in use.`;
  return null;
}
