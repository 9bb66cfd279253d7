import type { Metadata } from 'next';
import { LinkButton } from '@/components/ui/button';
import { passwordLink } from '@/db/entry/password-links';
import { LINK_SENTENCES } from '@/lib/views/person';
import { PublicPage } from '@/app/(public)/public-page';
import { SetPasswordForm } from './set-password-form';

// The address holds the secret: no other site and no search engine may learn it. Not 'no-referrer': with it a
// form sent without JavaScript carries "Origin: null", and the action refuses it as one from elsewhere.
export const metadata: Metadata = {
  title: 'Set a password',
  robots: { index: false, follow: false },
  referrer: 'same-origin',
};

export default async function SetPasswordPage({ params }: PageProps<'/set-password/[token]'>) {
  const { token } = await params;
  const link = await passwordLink(token);
  if (link.state !== 'open')
    return (
      <PublicPage title="This link sets no password">
        <p>{LINK_SENTENCES[link.state]}</p>
        <div>
          <LinkButton href="/sign-in">Sign in</LinkButton>
        </div>
      </PublicPage>
    );
  const { name, email, purpose } = link;
  return (
    <PublicPage title={purpose === 'invitation' ? 'Welcome to Halflight' : 'Set a new password'}>
      <p>
        For {name}, who signs in as <span className="num break-all">{email}</span>. The link works once.
      </p>
      <SetPasswordForm token={token} email={email} />
    </PublicPage>
  );
}
