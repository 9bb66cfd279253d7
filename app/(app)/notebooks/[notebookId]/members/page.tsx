import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { MemberTable, ShareLinkTable } from '@/components/notebook/member-tables';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { laboratory } from '@/db/entry/settings';
import { listMembers, possibleMembers } from '@/db/queries/members';
import { readNotebook } from '@/db/queries/notebooks';
import { listShareLinks } from '@/db/queries/share-links';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { MemberForm, RemoveMember } from './member-form';
import { RevokeLink, ShareForm } from './share-form';

export const metadata: Metadata = { title: 'Members' };

export default async function MembersPage({ params }: PageProps<'/notebooks/[notebookId]/members'>) {
  const actor = await requireActor();
  const { notebookId } = await params;
  const notebook = await orNotFound(readNotebook(actor, notebookId));
  if (!notebook.mayListMembers) notFound();
  const members = await listMembers(actor, notebookId);
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  const manages = notebook.mayManage;
  return (
    <>
      <PageHeader title="Members" />
      <Card flush title="Who works here and who reads" aside={`owned by ${notebook.owner}`}>
        <MemberTable
          owner={notebook.owner}
          members={members}
          timeZone={timeZone}
          removal={manages ? ({ id, name }) => <RemoveMember membershipId={id} name={name} /> : undefined}
        />
      </Card>
      {manages && (
        <>
          <Card title="Add a person">
            <MemberForm
              key={members.length}
              notebookId={notebookId}
              people={await possibleMembers(actor, notebookId)}
            />
          </Card>
          <Card title="Share read-only by a link" aside="no account needed">
            <ShareForm notebookId={notebookId} />
          </Card>
          <Card flush title="Links made so far">
            <ShareLinkTable
              links={await listShareLinks(actor, notebookId)}
              timeZone={timeZone}
              revocation={({ id, label }) => <RevokeLink shareLinkId={id} label={label} />}
            />
          </Card>
        </>
      )}
    </>
  );
}
