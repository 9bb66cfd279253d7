import { Pill, type Tone } from '@/components/ui/pill';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDateTime } from '@/lib/format/dates';
import type { TokenView } from '@/lib/views/person';
import { RevokeTokenForm } from './token-forms';

const STATES: Readonly<Record<TokenView['state'], { tone: Tone; word: string }>> = {
  good: { tone: 'order', word: 'good' },
  expired: { tone: 'plain', word: 'run out' },
  revoked: { tone: 'plain', word: 'revoked' },
};

export function TokenTable({ tokens, timeZone }: { tokens: readonly TokenView[]; timeZone: string }) {
  return (
    <Table label="Tokens made so far">
      <thead>
        <tr>
          <Th>For</Th>
          <Th>May</Th>
          <Th>State</Th>
          <Th>Good until</Th>
          <Th>Last used</Th>
          <Th>
            <span className="sr-only">Revoke</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {tokens.map((token) => (
          <tr key={token.id}>
            <RowHead>{token.name}</RowHead>
            <Td className="whitespace-nowrap">{token.scope === 'write' ? 'read and write' : 'read'}</Td>
            <Td className="whitespace-nowrap">
              <Pill tone={STATES[token.state].tone} quiet>
                {STATES[token.state].word}
              </Pill>
            </Td>
            <Td className="num text-sm whitespace-nowrap">{formatDateTime(token.expiresAt, timeZone)}</Td>
            <Td className="num text-sm whitespace-nowrap">
              {token.lastUsedAt ? formatDateTime(token.lastUsedAt, timeZone) : 'never'}
            </Td>
            <Td>{token.state === 'good' && <RevokeTokenForm id={token.id} name={token.name} />}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
