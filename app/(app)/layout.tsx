import type { ReactNode } from 'react';
import { redirect } from 'next/navigation';
import { AppFrame } from '@/components/frame/app-frame';
import { DemoBanner } from '@/components/frame/demo-banner';
import { Navigation } from '@/components/frame/navigation';
import { PageFooter } from '@/components/frame/page-footer';
import { laboratory } from '@/db/entry/settings';
import { account } from '@/db/queries/account';
import { listNotebooks } from '@/db/queries/notebooks';
import { ROLE_WORDS } from '@/lib/policies/role-words';
import { requireActor } from '@/app/_server/current-actor';
import { SharedLayout } from './shared-layout';
import { SignOutForm } from './sign-out/sign-out-form';

const RECENT = 5;

/**
 * The frame of every page behind the door. Its redirects are a courtesy, the loaders are the guard: a stranger is
 * led to the sign-in, and a person who has not read the cautions to them.
 */
export default async function SignedInLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor();
  const lab = await laboratory();
  const banner = lab?.demo ? <DemoBanner /> : null;
  if (actor.kind === 'link')
    return (
      <SharedLayout actor={actor} banner={banner}>
        {children}
      </SharedLayout>
    );
  if (!(await account(actor)).welcomed) redirect('/welcome');
  const notebooks = await listNotebooks(actor);
  const entries = [
    { href: '/notebooks', label: 'Notebooks', count: notebooks.length },
    ...(actor.role === 'administrator' ? [{ href: '/people', label: 'People' }] : []),
    { href: '/account', label: 'My account' },
  ];
  return (
    <AppFrame
      navigation={
        <Navigation
          entries={entries}
          recent={notebooks
            .slice(0, RECENT)
            .map(({ id, title }) => ({ href: `/notebooks/${id}`, label: title }))}
          person={{
            name: actor.name,
            role: actor.role ? ROLE_WORDS[actor.role] : '',
            laboratory: lab?.name ?? '',
          }}
          signOut={<SignOutForm />}
        />
      }
      banner={banner}
      footer={<PageFooter />}
    >
      {children}
    </AppFrame>
  );
}
