import type { Gap, Question, ReadOptions, ReadSpectrum, ReaderWarning } from '../types';
import { xOrder, type XOrder } from './order';
import { plateauWarning } from './plateau';
import { withoutRepeats } from './repeats';
import { sentinelValue, withGapsAt } from './sentinels';
import { finiteDraft, pickPoints, UNIT_WORDS, type SpectrumDraft } from './spectrum-draft';

/** How often each point is looked at here: stand-ins, order, equal x, plateau, gaps. */
const PASSES = 5;

export interface Finished {
  readonly spectra: ReadSpectrum[];
  readonly questions: Question[];
}

/**
 * Look a decoded spectrum over: values that mean "no reading", the order of x, equal x, plateaus, gaps. What a person
 * must decide becomes a question, with the answers of `options` applied; the rest becomes warnings.
 */
export function finishSpectrum(decoded: SpectrumDraft, options: ReadOptions): Finished {
  const questions: Question[] = [];
  options.onSteps?.(PASSES * decoded.x.length);
  const draft = dealWithSentinels(finiteDraft(decoded), options, questions);
  if (draft.x.length === 0) return { spectra: [], questions };
  const order = xOrder(draft.x);
  const parts = splitByOrder(draft, order, options, questions);
  const spectra: ReadSpectrum[] = [];
  for (const part of parts) {
    const scan = parts.length === 1 && (order.kind === 'turnRound' || order.kind === 'restarts');
    const repeats = scan ? undefined : withoutRepeats(part, options.equalX);
    if (repeats && repeats.conflicts > 0 && options.equalX === undefined)
      questions.push(equalXQuestion(part.name, repeats.conflicts));
    const cleaned = repeats?.draft ?? part;
    const warnings = [
      ...cleaned.warnings,
      ...orderWarnings(order, parts.length),
      ...(repeats?.warnings ?? []),
      ...gapWarnings(cleaned),
    ];
    const plateau = plateauWarning(cleaned);
    if (plateau) warnings.push(plateau);
    spectra.push({ ...cleaned, warnings });
  }
  return { spectra, questions };
}

function dealWithSentinels(draft: SpectrumDraft, options: ReadOptions, questions: Question[]): SpectrumDraft {
  if (options.missingValues !== undefined) return withGapsAt(draft, options.missingValues);
  const value = sentinelValue(draft.y);
  if (value === undefined) return draft;
  questions.push({
    code: 'SENTINEL',
    message: `The value ${value} repeats far outside all others${draft.name ? ` in ${draft.name}` : ''}. Does it stand for "no reading"?`,
    choices: [
      { label: `${value} means no reading`, options: { missingValues: [value] } },
      { label: `${value} is a reading`, options: { missingValues: [] } },
    ],
  });
  return withGapsAt(draft, [value]);
}

function splitByOrder(
  draft: SpectrumDraft,
  order: XOrder,
  options: ReadOptions,
  questions: Question[],
): SpectrumDraft[] {
  if (order.kind !== 'turnRound' && order.kind !== 'restarts') return [draft];
  const there = order.kind === 'turnRound';
  if (options.turnRound === undefined) {
    questions.push({
      code: there ? 'TURN_ROUND' : 'RESTARTS',
      message: there
        ? `x runs one way and back again${draft.name ? ` in ${draft.name}` : ''}. Are these two scans?`
        : `x starts again ${order.starts.length - 1} times${draft.name ? ` in ${draft.name}` : ''}. Are these ${order.starts.length} scans?`,
      choices: [
        { label: there ? 'Two scans' : `${order.starts.length} scans`, options: { turnRound: 'split' } },
        { label: 'One spectrum, as it stands', options: { turnRound: 'keep' } },
      ],
    });
  }
  if ((options.turnRound ?? 'keep') === 'keep') return [draft];
  const n = draft.x.length;
  if (there) {
    // The point of return belongs to both scans.
    return [pickScan(draft, 0, order.at, 1), pickScan(draft, order.at - 1, n, 2)];
  }
  return order.starts.map((start, k) => pickScan(draft, start, order.starts[k + 1] ?? n, k + 1));
}

function pickScan(draft: SpectrumDraft, from: number, to: number, scan: number): SpectrumDraft {
  const places = Array.from({ length: to - from }, (_, i) => from + i);
  return { ...pickPoints(draft, places), name: `${draft.name} (scan ${scan})` };
}

function equalXQuestion(name: string, conflicts: number): Question {
  return {
    code: 'EQUAL_X',
    message: `${conflicts} ${conflicts === 1 ? 'wavelength stands' : 'wavelengths stand'} more than once with different readings${name ? ` in ${name}` : ''}. Which are to be used?`,
    choices: [
      { label: 'The first', options: { equalX: 'first' } },
      { label: 'Their mean', options: { equalX: 'mean' } },
      { label: 'All of them', options: { equalX: 'keep' } },
    ],
  };
}

function orderWarnings(order: XOrder, parts: number): ReaderWarning[] {
  if (order.kind === 'unsorted')
    return [{ code: 'UNSORTED', message: 'The points are not in order of x; they are sorted for computing' }];
  if (order.kind === 'turnRound' && parts === 1)
    return [{ code: 'TURN_ROUND', message: 'x runs one way and back again: this may be two scans' }];
  if (order.kind === 'restarts' && parts === 1)
    return [{ code: 'RESTARTS', message: 'x starts again: this may be several scans' }];
  return [];
}

const REASON_WORDS: Record<Gap['reason'], string> = {
  aboveRange: 'above range',
  belowRange: 'below range',
  missing: 'missing',
  unreadable: 'not readable',
};

/** "301 points, 8 missing (OVER)": one warning for each reason, with the words that stood there. */
function gapWarnings(draft: SpectrumDraft): ReaderWarning[] {
  const warnings: ReaderWarning[] = [];
  for (const reason of ['aboveRange', 'belowRange', 'missing', 'unreadable'] as const) {
    const gaps = draft.gaps.filter((gap) => gap.reason === reason);
    if (gaps.length === 0) continue;
    const words = [...new Set(gaps.map((gap) => gap.text || 'empty'))].slice(0, 3).join(', ');
    const places = gaps.slice(0, 3).map((gap) => draft.x[gap.index]);
    const more = gaps.length > 3 ? ', …' : '';
    const message = `${draft.x.length} points, ${gaps.length} ${REASON_WORDS[reason]} (${words}) at ${places.join(', ')}${more} ${UNIT_WORDS[draft.xUnit]}`;
    warnings.push({
      code: reason === 'aboveRange' ? 'ABOVE_RANGE' : reason === 'belowRange' ? 'BELOW_RANGE' : 'GAPS',
      message,
      value: gaps.length,
    });
  }
  return warnings;
}
