import type { ReactNode } from 'react';
import { PageFooter } from '@/components/frame/page-footer';
import { SharedFrame } from '@/components/frame/shared-frame';
import { laboratory } from '@/db/entry/settings';
import { shareOf } from '@/db/entry/share-visits';
import { formatDate } from '@/lib/format/dates';
import type { Actor } from '@/lib/policies/actor';
import { openShareCookie } from '@/app/_server/session-cookie';

/** The frame for somebody with a link: whose notebook it is, until when, and no way to change anything. */
export async function SharedLayout({
  actor,
  banner,
  children,
}: {
  actor: Actor;
  banner: ReactNode;
  children: ReactNode;
}) {
  const { visits = [] } = await openShareCookie();
  const share = await shareOf(actor.sharedNotebookIds[0] ?? '', visits);
  const lab = await laboratory();
  return (
    <SharedFrame
      sharedBy={[share?.sharedBy, lab?.name].filter(Boolean).join(', ')}
      until={share ? formatDate(share.until, lab?.timeZone ?? 'UTC') : undefined}
      banner={banner}
      footer={<PageFooter />}
    >
      {children}
    </SharedFrame>
  );
}
