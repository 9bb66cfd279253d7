import Link from 'next/link';

/** The mark: a disc, half lit. */
export function BrandMark({ className = 'size-6.5' }: { className?: string }) {
  return (
    <svg viewBox="0 0 26 26" aria-hidden="true" className={className}>
      <circle cx="13" cy="13" r="12" className="fill-night-3" />
      <path d="M13 1a12 12 0 0 1 0 24z" className="fill-moon" />
    </svg>
  );
}

/** Mark and name, leading home. For the night side. */
export function Brand({ href = '/' }: { href?: string }) {
  return (
    <Link
      href={href}
      className="flex w-fit items-center gap-2.5 font-serif text-[1.1875rem] font-medium text-night-ink"
    >
      <BrandMark />
      Halflight
    </Link>
  );
}
