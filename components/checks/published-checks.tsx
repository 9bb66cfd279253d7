'use client';

import { useMemo, useState } from 'react';
import { publishedChecks } from '@/lib/checks/published-checks';
import type { CheckResults } from '@/lib/checks/run-checks';
import { ENGINE_VERSION } from '@/lib/engine';
import { CheckSummary } from './check-summary';
import { SourceCard } from './source-card';
import { useBrowserResults } from './use-browser-results';

/** The published checks with the server's numbers, which came with the page, and this browser's, made now. */
export function PublishedChecks({ server, serverEngine }: { server: CheckResults; serverEngine: string }) {
  const [sources] = useState(publishedChecks);
  const browser = useBrowserResults(sources);
  const both = useMemo(() => ({ browser, server }), [browser, server]);
  return (
    <>
      <div role="status">
        <CheckSummary
          sources={sources}
          both={both}
          engine={{ server: serverEngine, browser: ENGINE_VERSION }}
        />
      </div>
      {sources.map((source) => (
        <SourceCard key={source.id} source={source} both={both} />
      ))}
    </>
  );
}
