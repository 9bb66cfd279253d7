'use client';

import { Button, LinkButton } from '@/components/ui/button';
import { PlainPage } from '@/components/frame/plain-page';

/** What a person sees when a page broke: a sentence, the number under which the log holds it, two ways on. */
export default function ErrorPage({
  error,
  retry,
}: {
  error: Error & { digest?: string };
  retry: () => void;
}) {
  return (
    <PlainPage title="This page could not be shown">
      <p className="text-ink-2" role="alert">
        Something went wrong on our side. What was saved before is kept. Try again; if it happens once more,
        tell whoever runs Halflight
        {error.digest ? (
          <>
            {' '}
            and give them this number: <span className="num text-ink">{error.digest}</span>.
          </>
        ) : (
          '.'
        )}
      </p>
      <p className="flex flex-wrap gap-2">
        <Button variant="primary" onClick={() => retry()}>
          Try again
        </Button>
        <LinkButton href="/">Go to the notebooks</LinkButton>
      </p>
    </PlainPage>
  );
}
