import { ToneShape } from '@/components/ui/pill';

/** Said on every page of a demonstration. */
export function DemoBanner({
  children = 'Demonstration: the passwords are public. Put nothing here that matters.',
}: {
  children?: React.ReactNode;
}) {
  return (
    <aside
      aria-label="Demonstration"
      className="no-print flex items-center gap-2 border-b border-rule bg-amber-wash px-4 py-1.5 text-sm text-amber md:px-7.5"
    >
      <ToneShape tone="decide" />
      <p>{children}</p>
    </aside>
  );
}
