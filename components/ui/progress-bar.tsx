import { classNames } from './class-names';
import type { Tone } from './pill';

const FILL: Record<Tone, string> = {
  order: 'bg-verdigris',
  decide: 'bg-amber',
  stop: 'bg-red',
  note: 'bg-uv',
  plain: 'bg-control',
};

/** How far a thing has come: `fraction` 0 to 1, or null while that cannot be known. */
export function ProgressBar({
  label,
  fraction,
  tone = 'note',
  className,
}: {
  label: string;
  fraction: number | null;
  tone?: Tone;
  className?: string;
}) {
  const percent = fraction === null ? null : Math.round(Math.min(1, Math.max(0, fraction)) * 100);
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent ?? undefined}
      className={classNames('h-1.5 w-full overflow-hidden rounded-full bg-rule', className)}
    >
      <div
        className={classNames(
          'h-full rounded-full transition-[width]',
          FILL[tone],
          percent === null && 'animate-pulse',
        )}
        style={{ width: `${percent ?? 40}%` }}
      />
    </div>
  );
}
