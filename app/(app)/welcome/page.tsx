import type { Metadata } from 'next';
import { CautionList } from '@/components/cautions/caution-list';
import { PageHeader } from '@/components/frame/page-header';
import { LinkButton } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { account } from '@/db/queries/account';
import { CAUTIONS } from '@/lib/cautions';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { ConfirmForm } from './confirm-form';

export const metadata: Metadata = { title: 'Before you begin' };

/** The statements of limits, once for each person. */
export default async function WelcomePage() {
  const { name, welcomed } = await orNotFound(account(await requireActor()));
  return (
    <>
      <PageHeader
        title="Before you begin"
        lead={
          <p>
            Welcome, {name}. Please read once what this notebook is not. It stands under Cautions at the foot
            of every page.
          </p>
        }
      />
      <Card title="Cautions">
        <CautionList cautions={CAUTIONS} />
      </Card>
      <div>{welcomed ? <LinkButton href="/notebooks">Go to the notebooks</LinkButton> : <ConfirmForm />}</div>
    </>
  );
}
