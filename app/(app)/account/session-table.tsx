import { Pill } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDateTime } from '@/lib/format/dates';
import type { SessionView } from '@/lib/views/person';
import { EndSessionForm } from './account-forms';

/** Every browser in which this person is signed in. */
export function SessionTable({ sessions, timeZone }: { sessions: readonly SessionView[]; timeZone: string }) {
  return (
    <Table label="Where you are signed in">
      <thead>
        <tr>
          <Th>Signed in</Th>
          <Th>Last seen</Th>
          <Th>Ends by itself</Th>
          <Th>
            <span className="sr-only">End it</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {sessions.map((session) => {
          const opened = formatDateTime(session.openedAt, timeZone);
          return (
            <tr key={session.id}>
              <RowHead className="num text-sm font-normal whitespace-nowrap">{opened}</RowHead>
              <Td className="num text-sm whitespace-nowrap">
                {formatDateTime(session.lastSeenAt, timeZone)}
              </Td>
              <Td className="num text-sm whitespace-nowrap">{formatDateTime(session.endsAt, timeZone)}</Td>
              <Td className="whitespace-nowrap">
                {session.current ? (
                  <Pill tone="note">this browser</Pill>
                ) : (
                  <EndSessionForm id={session.id} opened={opened} />
                )}
              </Td>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}
