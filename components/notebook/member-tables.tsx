import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/empty-state';
import { Pill, type Tone } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDate, formatDateTime } from '@/lib/format/dates';
import { MEMBER_ROLE_WORDS } from '@/lib/policies/role-words';
import type { MemberView, ShareLinkView } from '@/lib/views/notebook';

export function MemberTable({
  owner,
  members,
  timeZone,
  removal,
}: {
  owner: string;
  members: readonly MemberView[];
  timeZone: string;
  removal?: (member: MemberView) => ReactNode;
}) {
  return (
    <Table label="Members">
      <thead>
        <tr>
          <Th>Name</Th>
          <Th>May</Th>
          <Th>Since</Th>
          {removal && <Th>{''}</Th>}
        </tr>
      </thead>
      <tbody>
        <tr>
          <RowHead>{owner}</RowHead>
          <Td>owner</Td>
          <Td>–</Td>
          {removal && <Td />}
        </tr>
        {members.map((member) => (
          <tr key={member.id}>
            <RowHead>{member.name}</RowHead>
            <Td>{MEMBER_ROLE_WORDS[member.role]}</Td>
            <Td className="text-ink-2">{formatDate(member.since, timeZone)}</Td>
            {removal && <Td className="text-right">{removal(member)}</Td>}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

const STATES: Record<ShareLinkView['state'], { tone: Tone; words: string }> = {
  open: { tone: 'order', words: 'open' },
  expired: { tone: 'plain', words: 'run out' },
  revoked: { tone: 'plain', words: 'withdrawn' },
};

export function ShareLinkTable({
  links,
  timeZone,
  revocation,
}: {
  links: readonly ShareLinkView[];
  timeZone: string;
  revocation: (link: ShareLinkView) => ReactNode;
}) {
  if (links.length === 0)
    return (
      <EmptyState title="No links yet">A link shows the notebook to somebody without an account.</EmptyState>
    );
  return (
    <Table label="Share links">
      <thead>
        <tr>
          <Th>For</Th>
          <Th>State</Th>
          <Th>Until</Th>
          <Th numeric>Opened</Th>
          <Th>Last opened</Th>
          <Th>{''}</Th>
        </tr>
      </thead>
      <tbody>
        {links.map((link) => (
          <tr key={link.id}>
            <RowHead>{link.label}</RowHead>
            <Td>
              <Pill tone={STATES[link.state].tone}>{STATES[link.state].words}</Pill>
            </Td>
            <Td className="whitespace-nowrap">{formatDate(link.expiresAt, timeZone)}</Td>
            <Td numeric>{link.openedCount}</Td>
            <Td className="whitespace-nowrap text-ink-2">
              {link.lastOpenedAt ? formatDateTime(link.lastOpenedAt, timeZone) : 'never'}
            </Td>
            <Td className="text-right">{link.state === 'open' && revocation(link)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
