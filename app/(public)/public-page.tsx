import type { ComponentProps, ReactNode } from 'react';
import { DemoBanner } from '@/components/frame/demo-banner';
import { PageFooter } from '@/components/frame/page-footer';
import { PlainPage } from '@/components/frame/plain-page';
import { laboratory } from '@/db/entry/settings';

/** A page that needs no account; in a demonstration it says so like every other. */
export async function PublicPage({
  title,
  width,
  children,
}: {
  title: ReactNode;
  width?: ComponentProps<typeof PlainPage>['width'];
  children: ReactNode;
}) {
  const lab = await laboratory();
  return (
    <PlainPage title={title} width={width} banner={lab?.demo && <DemoBanner />} footer={<PageFooter />}>
      {children}
    </PlainPage>
  );
}
