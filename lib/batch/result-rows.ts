import { dilutionText } from './dilution-text';
import type { BatchView } from '@/lib/views/batch';
import type { DeterminationView } from '@/lib/views/determination';

/** A cell that leaves the notebook: a number in full, a text, or nothing. */
export type ResultCell = number | string | null;

interface ResultColumn {
  readonly name: string;
  readonly unit: (batch: BatchView) => string;
  readonly cell: (determination: DeterminationView, batch: BatchView) => ResultCell;
}

const none = () => '';
const ofUnit = (batch: BatchView) => batch.method.unit;
const result = ({ result: { concentration } }: DeterminationView) => concentration;

/**
 * The columns of a result table that leaves the notebook, by copying or as a file. A result that is not
 * quantified has no number in any of them; its report says what is known.
 */
const COLUMNS: readonly ResultColumn[] = [
  { name: 'sample', unit: none, cell: ({ sample }) => sample },
  { name: 'report', unit: none, cell: ({ result: { report } }) => report },
  { name: 'value', unit: ofUnit, cell: (one) => result(one)?.value ?? null },
  { name: 'unit', unit: none, cell: (_one, { method }) => method.unit },
  { name: 'basis', unit: none, cell: (_one, { method }) => method.basis },
  { name: 'u', unit: ofUnit, cell: (one) => result(one)?.u ?? null },
  { name: 'U', unit: ofUnit, cell: (one) => result(one)?.U ?? null },
  { name: 'k', unit: none, cell: (one) => result(one)?.k ?? null },
  { name: 'coverage', unit: none, cell: (one, { method }) => (result(one) ? method.confidence : null) },
  { name: 'degrees of freedom', unit: none, cell: (one) => degreesOfFreedom(one) },
  { name: 'interval low', unit: ofUnit, cell: (one) => result(one)?.interval[0] ?? null },
  { name: 'interval high', unit: ofUnit, cell: (one) => result(one)?.interval[1] ?? null },
  { name: 'dilution', unit: () => 'mL', cell: ({ dilution }) => dilutionText(dilution) },
  { name: 'dilution factor', unit: none, cell: ({ result: { dilutionFactor } }) => dilutionFactor.value },
  {
    name: 'mean absorbance as read',
    unit: none,
    cell: ({ result: { absorbanceAsRead } }) => absorbanceAsRead,
  },
  { name: 'path length', unit: () => 'mm', cell: ({ pathLengthMm }) => pathLengthMm },
  { name: 'flags', unit: none, cell: ({ result: { flags } }) => flags.map(({ code }) => code).join(' ') },
  { name: 'curve', unit: none, cell: (_one, { curve }) => curve?.title ?? null },
  { name: 'curve version', unit: none, cell: (_one, { curve }) => curve?.version ?? null },
  {
    name: 'known absorptivity',
    unit: none,
    cell: (_one, { absorptivity }) => absorptivity?.title ?? null,
  },
  {
    name: 'absorptivity version',
    unit: none,
    cell: (_one, { absorptivity }) => absorptivity?.version ?? null,
  },
  { name: 'engine', unit: none, cell: ({ engineVersion }) => engineVersion },
  { name: 'batch', unit: none, cell: (_one, { title }) => title },
  { name: 'batch version', unit: none, cell: (_one, { version }) => version },
];

/** Null in the answer of the engine stands for infinitely many. */
function degreesOfFreedom(one: DeterminationView): ResultCell {
  const concentration = result(one);
  return concentration ? (concentration.degreesOfFreedom ?? 'infinite') : null;
}

export interface ResultTable {
  readonly names: readonly string[];
  readonly units: readonly string[];
  readonly rows: readonly (readonly ResultCell[])[];
}

/** The results of a batch, void determinations left out. */
export function resultTable(batch: BatchView): ResultTable {
  const current = batch.determinations.filter((determination) => determination.voidedAt === null);
  return {
    names: COLUMNS.map(({ name }) => name),
    units: COLUMNS.map(({ unit }) => unit(batch)),
    rows: current.map((determination) => COLUMNS.map(({ cell }) => cell(determination, batch))),
  };
}
