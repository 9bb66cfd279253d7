import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { laboratory } from '@/db/entry/settings';
import { ownTimeZone, timeZones } from '@/lib/time-zones';
import { PublicPage } from '@/app/(public)/public-page';
import { SetUpForm } from './set-up-form';

export const metadata: Metadata = { title: 'Set up the laboratory', robots: { index: false } };

/** Here only while there is no laboratory. */
export default async function SetUpPage() {
  if (await laboratory()) notFound();
  return (
    <PublicPage title="Set up the laboratory">
      <p className="text-ink-2">
        This makes the laboratory and its first administrator, who then adds everybody else.
      </p>
      <SetUpForm zones={timeZones()} zone={ownTimeZone()} />
    </PublicPage>
  );
}
