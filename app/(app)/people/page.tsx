import type { Metadata } from 'next';
import Link from 'next/link';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { laboratory } from '@/db/entry/settings';
import { listPeople } from '@/db/queries/people';
import { formatDate } from '@/lib/format/dates';
import { ROLE_WORDS } from '@/lib/policies/role-words';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { PersonState } from './person-state';

export const metadata: Metadata = { title: 'People' };

export default async function PeoplePage() {
  const people = await orNotFound(listPeople(await requireActor()));
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  const active = people.filter((person) => person.active).length;
  return (
    <>
      <PageHeader
        title="People"
        actions={
          <LinkButton href="/people/new" variant="primary">
            Add a person
          </LinkButton>
        }
      />
      <Card flush title="Accounts" aside={`${active} open, ${people.length - active} closed`}>
        <Table label="Accounts">
          <thead>
            <tr>
              <Th>Name</Th>
              <Th>E-mail address</Th>
              <Th>Role</Th>
              <Th>State</Th>
              <Th>Added</Th>
            </tr>
          </thead>
          <tbody>
            {people.map((person) => (
              <tr key={person.id}>
                <RowHead>
                  <Link href={`/people/${person.id}`} className="underline-offset-2 hover:underline">
                    {person.name}
                  </Link>
                </RowHead>
                <Td>{person.email}</Td>
                <Td className="whitespace-nowrap">{ROLE_WORDS[person.role]}</Td>
                <Td className="whitespace-nowrap">
                  <PersonState person={person} />
                </Td>
                <Td className="whitespace-nowrap text-ink-2">{formatDate(person.createdAt, timeZone)}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      </Card>
    </>
  );
}
