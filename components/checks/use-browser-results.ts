'use client';

import { useEffect, useState } from 'react';
import { type CheckResults, runSource } from '@/lib/checks/run-checks';
import type { CheckSource } from '@/lib/checks/types';

/** Runs the checks in this browser, a source at a time, so that the page stays alive between them. */
export function useBrowserResults(sources: readonly CheckSource[]): CheckResults {
  const [results, setResults] = useState<CheckResults>({});

  useEffect(() => {
    const left = [...sources];
    let timer = window.setTimeout(step);
    function step() {
      const source = left.shift();
      if (!source) return;
      const found = runSource(source);
      setResults((before) => ({ ...before, ...found }));
      timer = window.setTimeout(step);
    }
    return () => window.clearTimeout(timer);
  }, [sources]);

  return results;
}
