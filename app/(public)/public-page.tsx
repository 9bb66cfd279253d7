import type { ReactNode } from 'react';
import { DemoBanner } from '@/components/frame/demo-banner';
import { PageFooter } from '@/components/frame/page-footer';
import { PlainPage } from '@/components/frame/plain-page';
import { laboratory } from '@/db/entry/settings';

/** A page that needs no account; in a demonstration it says so like every other. */
export async function PublicPage({
  title,
  wide,
  children,
}: {
  title: ReactNode;
  wide?: boolean;
  children: ReactNode;
}) {
  const lab = await laboratory();
  return (
    <PlainPage title={title} wide={wide} banner={lab?.demo && <DemoBanner />} footer={<PageFooter />}>
      {children}
    </PlainPage>
  );
}
