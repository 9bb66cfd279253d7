import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { publicAccounts } from '@/db/entry/demo-accounts';
import { laboratory } from '@/db/entry/settings';
import { PublicPage } from '@/app/(public)/public-page';
import { DemoAccounts } from './demo-accounts';
import { SignInForm } from './sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage() {
  const lab = await laboratory();
  if (!lab) redirect('/set-up');
  const accounts = await publicAccounts();
  return (
    <PublicPage title="Sign in">
      <p className="text-ink-2">{lab.name}</p>
      <SignInForm />
      <p className="text-sm text-ink-2">
        No account, or the password is gone? Ask an administrator of the laboratory for a link to set one.
      </p>
      {accounts.length > 0 && <DemoAccounts accounts={accounts} />}
    </PublicPage>
  );
}
