import Link from 'next/link';

import { CAUTION_LINE } from '@/lib/cautions';

const LINK = 'text-uv underline underline-offset-2 hover:text-uv-deep';

/** The foot of every page: where the limits of all this are written, and whether it calculates right. */
export function PageFooter({ cautionsHref = '/cautions' }: { cautionsHref?: string }) {
  return (
    <footer className="mt-auto flex flex-wrap gap-x-4 gap-y-1 px-4 pt-8 pb-5 text-sm text-ink-2 md:px-7.5">
      <p>{CAUTION_LINE}</p>
      <Link href={cautionsHref} className={LINK}>
        Cautions
      </Link>
      <Link href="/is-it-right" className={LINK}>
        Is it right?
      </Link>
    </footer>
  );
}
