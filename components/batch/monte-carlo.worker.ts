import { monteCarlo } from '@/lib/engine/monte-carlo/monte-carlo';
import type { MonteCarloAsked, MonteCarloAnswered } from './monte-carlo-messages';

/** Draws the trials of one result off the page's thread, so that the page stays alive meanwhile. */
addEventListener('message', ({ data }: MessageEvent<MonteCarloAsked>) => {
  const answered = ((): MonteCarloAnswered => {
    try {
      return { answer: monteCarlo(data.request, 0, data.options), error: null };
    } catch (error) {
      return { answer: null, error: error instanceof Error ? error.message : String(error) };
    }
  })();
  postMessage(answered);
});
