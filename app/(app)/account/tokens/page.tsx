import type { Metadata } from 'next';
import { PageHeader } from '@/components/frame/page-header';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { appUrl, laboratory } from '@/db/entry/settings';
import { listTokens } from '@/db/queries/tokens';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { NewTokenForm } from './token-forms';
import { TokenTable } from './token-table';

export const metadata: Metadata = { title: 'Access tokens' };

export default async function TokensPage() {
  const tokens = await orNotFound(listTokens(await requireActor()));
  const timeZone = (await laboratory())?.timeZone ?? 'UTC';
  return (
    <>
      <PageHeader
        crumbs={[{ href: '/account', label: 'My account' }, { label: 'Access tokens' }]}
        title="Access tokens"
        lead={
          <p>
            With a token a script uses <span className="num text-sm break-all">{appUrl()}/api/v1</span> in
            your name; <span className="num text-sm">/api/v1/me</span> tells it whose it is.
          </p>
        }
      />
      <Card title="New token">
        <NewTokenForm />
      </Card>
      <Card flush title="Tokens made so far">
        {tokens.length > 0 ? (
          <TokenTable tokens={tokens} timeZone={timeZone} />
        ) : (
          <EmptyState title="No tokens yet">
            Make one above when a script needs to read or write here.
          </EmptyState>
        )}
      </Card>
    </>
  );
}
