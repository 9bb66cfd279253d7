import type { Metadata } from 'next';
import { PublishedChecks } from '@/components/checks/published-checks';
import { ReadingNotes } from '@/components/checks/reading-notes';
import { publishedChecks } from '@/lib/checks/published-checks';
import { type CheckResults, runSource } from '@/lib/checks/run-checks';
import { ENGINE_VERSION } from '@/lib/engine';
import { PublicPage } from '@/app/(public)/public-page';

export const metadata: Metadata = { title: 'Is it right?' };

// the server's numbers are calculated when somebody asks, never kept from the build
export const dynamic = 'force-dynamic';

export default function IsItRightPage() {
  const server: CheckResults = Object.assign({}, ...publishedChecks().map(runSource));
  return (
    <PublicPage title="Is it right?" width="tables">
      <p className="max-w-3xl text-ink-2">
        Published examples, calculated again now: in your browser and on the server, by the engine that
        calculates your results. The engine itself knows none of the expected values.
      </p>
      <ReadingNotes />
      <PublishedChecks server={server} serverEngine={ENGINE_VERSION} />
    </PublicPage>
  );
}
