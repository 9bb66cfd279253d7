import Link from 'next/link';

/** The foot of every page: where the limits of all this are written. */
export function PageFooter({ cautionsHref = '/cautions' }: { cautionsHref?: string }) {
  return (
    <footer className="mt-auto flex flex-wrap gap-x-4 gap-y-1 px-4 pt-8 pb-5 text-sm text-ink-2 md:px-7.5">
      <p>Not for diagnosis. A standard, a code or a licensed method goes before what is shown here.</p>
      <Link href={cautionsHref} className="text-uv underline underline-offset-2 hover:text-uv-deep">
        Cautions
      </Link>
    </footer>
  );
}
