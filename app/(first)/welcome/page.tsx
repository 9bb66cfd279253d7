import type { Metadata } from 'next';
import { CautionList } from '@/components/cautions/caution-list';
import { LinkButton } from '@/components/ui/button';
import { account } from '@/db/queries/account';
import { CAUTIONS } from '@/lib/cautions';
import { PublicPage } from '@/app/(public)/public-page';
import { requireActor } from '@/app/_server/current-actor';
import { orNotFound } from '@/app/_server/page-data';
import { SignOutForm } from '@/app/(app)/sign-out/sign-out-form';
import { ConfirmForm } from './confirm-form';

export const metadata: Metadata = { title: 'Before you begin' };

/** The statements of limits, once for each person; every page behind the door leads here until they were read. */
export default async function WelcomePage() {
  const { name, welcomed } = await orNotFound(account(await requireActor()));
  return (
    <PublicPage title="Before you begin" width="text">
      <p>
        Welcome, {name}. Please read once what this notebook is not. It stands under Cautions at the foot of
        every page.
      </p>
      <CautionList cautions={CAUTIONS} />
      <div className="flex flex-wrap items-center gap-4">
        {welcomed ? <LinkButton href="/notebooks">Go to the notebooks</LinkButton> : <ConfirmForm />}
        <SignOutForm className="hover:text-uv" />
      </div>
    </PublicPage>
  );
}
