import { dilutionText } from '@/lib/batch/dilution-text';
import type { DilutionStep } from '@/lib/engine';
import type { Actor } from '@/lib/policies/actor';
import type { DeterminationChange } from '@/lib/views/determination';
import { listFor } from './access';
import type { DeterminationRow, ReadingRow } from './models/batches';
import type { RecordEntryRow } from './models/record-entry';

interface Placed extends DeterminationChange {
  /** Number of the record entry. */
  readonly entry: number;
}

type Values = Readonly<Record<string, unknown>>;

const shown = (row: { value: unknown; gapText: unknown }) => String(row.value ?? row.gapText ?? 'empty');

const mm = (value: unknown) => (typeof value === 'number' ? `${value} mm` : 'not given');

const WORDS: Readonly<Record<string, (from: Values, to: Values) => string>> = {
  sample: (from, to) => `the sample is now called ${String(to.sample)} (was ${String(from.sample)})`,
  pathLengthMm: (from, to) =>
    `the path length is now ${String(to.pathLengthMm)} mm (was ${String(from.pathLengthMm)} mm)`,
  pathLengthUMm: (from, to) =>
    `the standard uncertainty of the path length is now ${mm(to.pathLengthUMm)} (was ${mm(from.pathLengthUMm)})`,
  dilution: (from, to) =>
    `the dilution is now ${dilutionWords(to.dilution)} (was ${dilutionWords(from.dilution)})`,
  voidedAt: () => 'declared void',
};

function dilutionWords(steps: unknown): string {
  return dilutionText((steps ?? []) as readonly DilutionStep[]) || 'none';
}

function determinationWords(entry: RecordEntryRow): string | null {
  if (entry.verb === 'created') return 'saved';
  const { from, to } = entry;
  if (!from || !to) return null;
  const changes = Object.keys(to).flatMap((column) => WORDS[column]?.(from, to) ?? []);
  return changes.length > 0 ? changes.join('; ') : null;
}

function readingWords(entry: RecordEntryRow, readings: ReadonlyMap<string, ReadingRow>): string | null {
  const reading = readings.get(entry.subjectId ?? '');
  const before = reading?.supersedesId ? readings.get(reading.supersedesId) : undefined;
  if (entry.verb !== 'created' || !reading || !before) return null;
  return `reading ${reading.position} is now ${shown(reading)} (was ${shown(before)})`;
}

/** What the record says about a determination and its readings, oldest first. */
async function entriesOf(
  actor: Actor,
  row: DeterminationRow,
  readings: readonly ReadingRow[],
): Promise<RecordEntryRow[]> {
  const subjectId = [row.id, ...readings.map((reading) => reading.id)];
  return listFor(actor, 'recordEntry', row.notebookId, { where: { subjectId }, order: [['id', 'ASC']] });
}

function placed(entries: readonly RecordEntryRow[], readings: readonly ReadingRow[]): Placed[] {
  const byId = new Map(readings.map((reading) => [reading.id, reading]));
  return entries.flatMap((entry) => {
    const what = entry.kind === 'reading' ? readingWords(entry, byId) : determinationWords(entry);
    if (what === null) return [];
    return [{ entry: entry.id, at: entry.at.toISOString(), who: entry.actorName, what, why: entry.why }];
  });
}

/** The history of a determination in words, oldest first. `readings` are all of it, the superseded too. */
export async function historyOf(
  actor: Actor,
  row: DeterminationRow,
  readings: readonly ReadingRow[],
): Promise<DeterminationChange[]> {
  const history = placed(await entriesOf(actor, row, readings), readings);
  return history.map(({ at, who, what, why }) => ({ at, who, what, why }));
}

/** What happened to a determination after the version that somebody was looking at, in a sentence. */
export async function changesSince(
  actor: Actor,
  row: DeterminationRow,
  readings: readonly ReadingRow[],
  seenVersion: number,
): Promise<string> {
  const entries = await entriesOf(actor, row, readings);
  const first = entries.find((entry) => Number((entry.to as Values | null)?.version ?? 0) > seenVersion);
  const since = placed(entries, readings).filter(({ entry }) => first && entry >= first.id);
  const who = [...new Set(since.map((change) => change.who))].join(' and ');
  const what = since
    .map((change) => (change.why ? `${change.what} – ${change.why}` : change.what))
    .join('; ');
  return `${who || 'Somebody'} changed this meanwhile: ${what || 'a newer version was saved'}. What you typed is kept: look at both, then save again`;
}
