import type { Metadata } from 'next';
import { PlainPage } from '@/components/frame/plain-page';
import { PageFooter } from '@/components/frame/page-footer';

export const metadata: Metadata = { title: 'This link opens nothing' };

export default function LinkSpentPage() {
  return (
    <PlainPage title="This link opens nothing" footer={<PageFooter />}>
      <p>It has run out, was withdrawn, or was not copied whole. Ask whoever sent it for a new one.</p>
    </PlainPage>
  );
}
