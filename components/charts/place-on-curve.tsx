import { cssColour } from './chart-colour';
import { TONE_LOOK, type UnknownTone } from './curve-model';

const RAIL = { from: 4, to: 156, start: 16, end: 140 } as const;

/** Where a value lies on the small rail, in its own px; beyond the rail it stands at the rail's end. */
export function placeOnRail(value: number, min: number, max: number): number {
  const along = RAIL.start + ((value - min) / (max - min)) * (RAIL.end - RAIL.start);
  return Math.min(RAIL.to, Math.max(RAIL.from, along));
}

function words(value: number | null, min: number, max: number): string {
  if (value === null) return 'No place on the curve';
  if (value > max) return 'Above the top standard';
  if (value < min) return 'Below the lowest standard';
  const percent = Math.round((100 * (value - min)) / (max - min));
  return `Within the standards, ${percent} % of the way up`;
}

/** The place of a result within the standards' range, for a table's cell. `value` null: above what can be read. */
export function PlaceOnCurve({
  value,
  min,
  max,
  tone,
  label,
}: {
  /** in the measured solution, in the unit of min and max; null when there is no number */
  value: number | null;
  min: number;
  max: number;
  tone: UnknownTone;
  /** replaces the words made from the numbers */
  label?: string;
}) {
  const colour = cssColour(TONE_LOOK[tone].colour);
  const said = label ?? words(value, min, max);
  const at = value === null ? null : placeOnRail(value, min, max);
  return (
    <svg
      width="160"
      height="16"
      viewBox="0 0 160 16"
      role="img"
      aria-label={said}
      className="inline-block align-middle"
    >
      <title>{said}</title>
      <rect x={RAIL.from} y="6.5" width={RAIL.to - RAIL.from} height="3" rx="1.5" className="fill-rule" />
      <rect x={RAIL.start} y="6.5" width={RAIL.end - RAIL.start} height="3" className="fill-band" />
      <path d={`M${RAIL.start} 4v8M${RAIL.end} 4v8`} className="stroke-control" />
      {at !== null && tone === 'order' && <circle cx={at} cy="8" r="4.5" fill={colour} />}
      {at !== null && tone === 'decide' && (
        <path d={`M${at} 2.4 ${at + 5.6} 8 ${at} 13.6 ${at - 5.6} 8Z`} fill={colour} />
      )}
      {(at === null || tone === 'stop') && (
        <path
          d={`M${(at ?? RAIL.to) - 5} 2.5 ${(at ?? RAIL.to) + 4} 8 ${(at ?? RAIL.to) - 5} 13.5Z`}
          fill={colour}
        />
      )}
    </svg>
  );
}
