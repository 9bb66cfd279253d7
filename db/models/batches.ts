import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { SampleResult } from '@/lib/batch/yardstick';
import type { DilutionStep, ReadingRule, Signal } from '@/lib/engine';
import {
  id,
  json,
  moment,
  optionalJson,
  optionalMoment,
  optionalReal,
  optionalReference,
  optionalText,
  real,
  reference,
  text,
  whole,
  columns,
} from './columns';

type Row<T extends Model> = Model<InferAttributes<T>, InferCreationAttributes<T>>;

export interface BatchRow extends Row<BatchRow> {
  id: CreationOptional<string>;
  notebookId: string;
  /** A batch is read on a curve or on a known absorptivity; the table holds to exactly one. */
  curveId: string | null;
  absorptivityId: string | null;
  lineageId: string;
  version: number;
  supersedesId: string | null;
  title: string;
  note: string;
  status: 'open' | 'superseded' | 'void';
  voidReason: CreationOptional<string | null>;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineBatch = (sequelize: Sequelize) =>
  sequelize.define<BatchRow>(
    'Batch',
    columns({
      id,
      notebookId: reference,
      curveId: optionalReference,
      absorptivityId: optionalReference,
      lineageId: reference,
      version: whole,
      supersedesId: optionalReference,
      title: text,
      note: text,
      status: text,
      voidReason: optionalText,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'batches', underscored: true },
  );

export interface DeterminationRow extends Row<DeterminationRow> {
  id: CreationOptional<string>;
  notebookId: string;
  batchId: string;
  position: number;
  sample: string;
  note: string;
  pathLengthMm: number;
  pathLengthUMm: number | null;
  dilution: DilutionStep[];
  /** What the engine answered on the server from the stored readings. */
  result: SampleResult;
  engineVersion: string;
  version: CreationOptional<number>;
  voidedAt: CreationOptional<Date | null>;
  voidReason: CreationOptional<string | null>;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineDetermination = (sequelize: Sequelize) =>
  sequelize.define<DeterminationRow>(
    'Determination',
    columns({
      id,
      notebookId: reference,
      batchId: reference,
      position: whole,
      sample: text,
      note: text,
      pathLengthMm: real,
      pathLengthUMm: optionalReal,
      dilution: json,
      result: json,
      engineVersion: text,
      version: { ...whole, defaultValue: 1 },
      voidedAt: optionalMoment,
      voidReason: optionalText,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'determinations', underscored: true },
  );

/** One reading of a standard or of a determination: a number, or a gap with its reason; never both. */
export interface ReadingRow extends Row<ReadingRow> {
  id: CreationOptional<string>;
  notebookId: string;
  standardId: string | null;
  determinationId: string | null;
  position: number;
  /** As it came, in its signal. */
  value: number | null;
  /** What the second wavelength of the rule read, taken off by the calculation; null without one. */
  minusValue: CreationOptional<number | null>;
  gapReason: 'aboveRange' | 'missing' | 'unreadable' | null;
  /** What stood where the number should be, such as OVER. */
  gapText: string | null;
  signal: Signal;
  origin: 'typed' | 'spectrum';
  spectrumId: string | null;
  rule: ReadingRule | null;
  /** Corrections made to the spectrum before it was read; null means none. */
  recipe: readonly unknown[] | null;
  pathLengthMm: number;
  excludedReason: string | null;
  supersedesId: CreationOptional<string | null>;
  supersededAt: CreationOptional<Date | null>;
  /** Why this reading replaces an earlier one. */
  reason: CreationOptional<string | null>;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineReading = (sequelize: Sequelize) =>
  sequelize.define<ReadingRow>(
    'Reading',
    columns({
      id,
      notebookId: reference,
      standardId: optionalReference,
      determinationId: optionalReference,
      position: whole,
      value: optionalReal,
      minusValue: optionalReal,
      gapReason: optionalText,
      gapText: optionalText,
      signal: text,
      origin: text,
      spectrumId: optionalReference,
      rule: optionalJson,
      recipe: optionalJson,
      pathLengthMm: real,
      excludedReason: optionalText,
      supersedesId: optionalReference,
      supersededAt: optionalMoment,
      reason: optionalText,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'readings', underscored: true },
  );
