import { classNames } from './class-names';

/** The place of something still on its way. `label` is what a screen reader hears. */
export function Skeleton({
  rows = 3,
  label = 'Loading',
  className,
}: {
  rows?: number;
  label?: string;
  className?: string;
}) {
  return (
    <div role="status" className={classNames('grid gap-3 p-4', className)}>
      <span className="sr-only">{label}</span>
      {Array.from({ length: rows }, (_, row) => (
        <span
          key={row}
          aria-hidden="true"
          className="h-4 animate-pulse rounded-full bg-raised"
          style={{ width: `${92 - ((row * 17) % 40)}%` }}
        />
      ))}
    </div>
  );
}
