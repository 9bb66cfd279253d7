import { Notice } from '@/components/ui/notice';
import { ProgressBar } from '@/components/ui/progress-bar';
import { tally } from '@/lib/checks/run-checks';
import type { CheckSource } from '@/lib/checks/types';
import { apartText, type BothResults, disagreeing } from './check-words';

interface SummaryProps {
  readonly sources: readonly CheckSource[];
  readonly both: BothResults;
  /** Versions of the engine: the server's and this browser's. */
  readonly engine: { readonly server: string; readonly browser: string };
}

function engineText({ server, browser }: SummaryProps['engine']): string {
  return server === browser
    ? `Engine version ${server}.`
    : `Engine version ${browser} in this browser, ${server} on the server: reload the page.`;
}

function Disagreement({ sources, both, engine }: SummaryProps) {
  const wrong = disagreeing(sources, both);
  const { total } = tally(sources, both.server);
  return (
    <Notice
      tone="stop"
      title={`${wrong.length} of ${total} published values ${wrong.length === 1 ? 'does' : 'do'} not agree`}
    >
      <p>
        Do not report numbers calculated here. Write to your laboratory’s administrator: which values, which
        browser, and the version of the engine. {engineText(engine)}
      </p>
      <ul className="mt-1 grid gap-0.5">
        {wrong.map(({ id, what }) => (
          <li key={id}>
            <a href={`#${id}`} className="text-red underline underline-offset-2">
              {sources.find(({ checks }) => checks.some((check) => check.id === id))?.title}: {what}
            </a>
          </li>
        ))}
      </ul>
    </Notice>
  );
}

/** One sentence over all checks; red with what to do when a single value disagrees. */
export function CheckSummary(props: SummaryProps) {
  const { sources, both, engine } = props;
  if (disagreeing(sources, both).length > 0) return <Disagreement {...props} />;
  const { agree, waiting, total } = tally(sources, both.browser);
  if (waiting > 0) {
    return (
      <Notice
        title={`${total} of ${total} published values agree on the server; this browser is calculating`}
      >
        <p>
          {agree} of {total} done here. {engineText(engine)}
        </p>
        <ProgressBar className="mt-2" label="Checks done in this browser" fraction={agree / total} />
        <noscript>This browser runs no scripts, so its own column stays empty.</noscript>
      </Notice>
    );
  }
  return (
    <Notice
      tone="order"
      title={`${agree} of ${total} published values agree in this browser and on the server`}
    >
      <p>
        {engineText(engine)} {apartText(both)}
      </p>
    </Notice>
  );
}
