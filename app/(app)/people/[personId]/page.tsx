import type { Metadata } from 'next';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { laboratory } from '@/db/entry/settings';
import { person as readPerson } from '@/db/queries/people';
import { formatDateTime } from '@/lib/format/dates';
import type { PersonView } from '@/lib/views/person';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { PersonState } from '@/app/(app)/people/person-state';
import { AccessForm, ChangePersonForm, MakeLinkForm, WithdrawLinkForm } from './person-forms';

export const metadata: Metadata = { title: 'Person' };

function linkSentence({ hasPassword, openLink }: PersonView, timeZone: string): string {
  const has = hasPassword ? 'A password is set.' : 'No password is set yet.';
  if (!openLink)
    return `${has} There is no open link; whoever lost a password gets one here, good for 48 hours.`;
  return `${has} A link made before is open until ${formatDateTime(openLink.expiresAt, timeZone)}; a new one takes its place.`;
}

export default async function PersonPage({ params }: PageProps<'/people/[personId]'>) {
  const { personId } = await params;
  const person = await orNotFound(readPerson(await requireActor(), personId));
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  return (
    <>
      <PageHeader
        crumbs={[{ href: '/people', label: 'People' }, { label: person.name }]}
        title={person.name}
        status={<PersonState person={person} />}
      />
      <div className="grid items-start gap-4.5 lg:grid-cols-2">
        <Card title="Name, address and role">
          <ChangePersonForm person={person} />
        </Card>
        <div className="grid gap-4.5">
          {person.active && (
            <Card title="Password">
              <div className="grid gap-3">
                <p>{linkSentence(person, timeZone)}</p>
                <MakeLinkForm personId={person.id} />
                {person.openLink && <WithdrawLinkForm personId={person.id} />}
              </div>
            </Card>
          )}
          <Card title={person.active ? 'Close the account' : 'Open the account again'}>
            <div className="grid gap-3">
              <p>
                {person.active
                  ? 'They are signed out everywhere at once, and their access tokens and links end. What they did stays, under their name.'
                  : 'They can sign in again with the password they had. Tokens and sessions that ended stay ended.'}
              </p>
              <AccessForm key={String(person.active)} personId={person.id} active={person.active} />
            </div>
          </Card>
        </div>
      </div>
    </>
  );
}
