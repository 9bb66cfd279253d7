import type { Metadata } from 'next';

import { PlainPage } from '@/components/frame/plain-page';
import { LinkButton } from '@/components/ui/button';

export const metadata: Metadata = { title: 'Not found' };

export default function NotFound() {
  return (
    <PlainPage title="There is nothing here">
      <p className="text-ink-2">
        This page does not exist, or it belongs to a notebook that you cannot see. Check the address, or ask
        the owner of the notebook to add you.
      </p>
      <p>
        <LinkButton href="/" variant="primary">
          Go to the notebooks
        </LinkButton>
      </p>
    </PlainPage>
  );
}
