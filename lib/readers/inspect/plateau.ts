import type { ReaderWarning } from '../types';
import { UNIT_WORDS, type SpectrumDraft } from './spectrum-draft';

/** So many neighbouring equal values at the top are no chance. */
const PLATEAU = 3;

/**
 * Warn of neighbouring equal values at the top of an absorbance spectrum (at the bottom of a transmittance one): an
 * instrument that stops at its limit writes the limit and says nothing.
 */
export function plateauWarning(draft: SpectrumDraft): ReaderWarning | undefined {
  const dark = draft.signal === 'transmittance' || draft.signal === 'percentTransmittance';
  const { x, y } = draft;
  let extreme = dark ? Infinity : -Infinity;
  let other = dark ? -Infinity : Infinity;
  for (const value of y) {
    if (Number.isNaN(value)) continue;
    if (dark ? value < extreme : value > extreme) extreme = value;
    if (dark ? value > other : value < other) other = value;
  }
  if (!Number.isFinite(extreme) || extreme === other) return undefined;
  let longest = 0;
  let from = 0;
  let run = 0;
  for (let i = 0; i < y.length; i++) {
    run = y[i] === extreme ? run + 1 : 0;
    if (run > longest) {
      longest = run;
      from = i - run + 1;
    }
  }
  if (longest < PLATEAU) return undefined;
  const unit = UNIT_WORDS[draft.xUnit];
  const message = `${longest} neighbouring points stand at exactly ${extreme}, from ${x[from]} to ${x[from + longest - 1]} ${unit}: the instrument may have stopped at its limit`;
  return { code: 'PLATEAU', message, value: extreme };
}
