'use client';

import { useEffect, useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Facts } from '@/components/ui/facts';
import { ToneShape, type Tone } from '@/components/ui/pill';
import type { CurveRequest } from '@/lib/engine';
import type { MonteCarloAnswer } from '@/lib/engine/monte-carlo/simulate-result';
import { formatNumber } from '@/lib/format/number';
import { roundPair, significantText, toDecimals } from '@/lib/format/round';
import type { MonteCarloAnswered } from './monte-carlo-messages';

const FIRST_RUN = 100_000;
const LONGER_RUN = 1_000_000;
/** Written beside the answer, so that anybody can draw the same trials again. */
const SEED = 20261201;

const TONE: Readonly<Record<MonteCarloAnswer['agreement']['verdict'], Tone>> = {
  agree: 'order',
  differ: 'decide',
  undecided: 'note',
};

type State =
  | { readonly step: 'idle' }
  | { readonly step: 'running'; readonly trials: number }
  | { readonly step: 'done'; readonly answer: MonteCarloAnswer }
  | { readonly step: 'failed'; readonly message: string };

/** One worker at a time; leaving the page ends it. */
function useTrials(request: CurveRequest) {
  const worker = useRef<Worker | null>(null);
  const [state, setState] = useState<State>({ step: 'idle' });
  useEffect(() => () => worker.current?.terminate(), []);

  function run(trials: number) {
    worker.current?.terminate();
    const own = new Worker(new URL('./monte-carlo.worker.ts', import.meta.url));
    worker.current = own;
    setState({ step: 'running', trials });
    own.onmessage = ({ data }: MessageEvent<MonteCarloAnswered>) => {
      own.terminate();
      setState(
        data.answer
          ? { step: 'done', answer: data.answer }
          : { step: 'failed', message: data.error ?? 'This result has no number to draw about' },
      );
    };
    own.onerror = ({ message }) => {
      own.terminate();
      setState({ step: 'failed', message: message || 'The worker of this browser did not start' });
    };
    own.postMessage({ request, options: { trials, seed: SEED } });
  }
  return { state, run };
}

function Answer({ answer, unit }: { answer: MonteCarloAnswer; unit: string }) {
  const { decimals, exponent } = roundPair(answer.mean, answer.u, 2);
  const digits = (x: number) => (exponent === null ? toDecimals(x, decimals) : formatNumber(x, 4));
  const span = ([low, high]: readonly [number, number]) => `${digits(low)} to ${digits(high)}`;
  return (
    <>
      <p className="flex gap-2" role="status">
        <ToneShape tone={TONE[answer.agreement.verdict]} className="mt-1.5" />
        <span>{answer.agreement.sentence}</span>
      </p>
      <Facts
        label="Figures of the trials"
        facts={[
          {
            label: 'Mean of the trials',
            value: (
              <>
                {digits(answer.mean)} <small>{unit}</small>
              </>
            ),
          },
          {
            label: 'Their standard deviation',
            value: (
              <>
                {significantText(answer.u, 2)} <small>{unit}</small>
              </>
            ),
          },
          {
            label: 'Interval, equal tails',
            value: (
              <>
                {span(answer.interval)} <small>{unit}</small>
              </>
            ),
            note: `shortest: ${span(answer.shortest)} ${unit}`,
          },
        ]}
      />
    </>
  );
}

/** The budget held against a Monte Carlo run of the same inputs (JCGM 101), drawn in the person's own browser. */
export function MonteCarloCard({ request, unit }: { request: CurveRequest; unit: string }) {
  const { state, run } = useTrials(request);
  const running = state.step === 'running';
  const undecided = state.step === 'done' && state.answer.agreement.verdict === 'undecided';
  return (
    <Card title="The same by Monte Carlo" aside={`JCGM 101 · seed ${SEED}`}>
      <div className="grid gap-3">
        <p className="text-sm text-ink-2">
          Draws every input again and again from what is known of it, and shows whether the budget&rsquo;s
          interval can be trusted.
        </p>
        {state.step === 'done' && <Answer answer={state.answer} unit={unit} />}
        {state.step === 'failed' && <p role="alert">The trials could not be drawn: {state.message}.</p>}
        <div className="flex flex-wrap gap-2">
          <Button disabled={running} onClick={() => run(undecided ? LONGER_RUN : FIRST_RUN)}>
            {running
              ? `Drawing ${state.trials} trials…`
              : undecided
                ? `Draw ${LONGER_RUN} trials`
                : `Draw ${FIRST_RUN} trials`}
          </Button>
        </div>
      </div>
    </Card>
  );
}
