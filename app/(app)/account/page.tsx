import type { Metadata } from 'next';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { laboratory } from '@/db/entry/settings';
import { account } from '@/db/queries/account';
import { listSessions } from '@/db/queries/sessions';
import { ROLE_WORDS } from '@/lib/policies/role-words';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { NameForm, PasswordForm, SignOutEverywhereForm } from './account-forms';
import { SessionTable } from './session-table';

export const metadata: Metadata = { title: 'My account' };

export default async function AccountPage() {
  const actor = await requireActor();
  const { name, email, role } = await orNotFound(account(actor));
  const sessions = await listSessions(actor);
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  return (
    <>
      <PageHeader
        title="My account"
        lead={
          <p>
            <span className="break-all">{email}</span>, {ROLE_WORDS[role]}. An administrator changes these
            two.
          </p>
        }
        actions={<LinkButton href="/account/tokens">Access tokens</LinkButton>}
      />
      <div className="grid items-start gap-4.5 lg:grid-cols-2">
        <Card title="Your name">
          <NameForm name={name} />
        </Card>
        <Card title="Password">
          <PasswordForm email={email} />
        </Card>
      </div>
      <Card flush title="Where you are signed in" actions={<SignOutEverywhereForm />}>
        <SessionTable sessions={sessions} timeZone={timeZone} />
      </Card>
    </>
  );
}
