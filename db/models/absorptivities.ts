import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { AbsorptivityKind, ReadingRule, Signal } from '@/lib/engine';
import {
  id,
  json,
  moment,
  optionalReal,
  optionalReference,
  optionalText,
  real,
  reference,
  text,
  whole,
  columns,
} from './columns';

/** A known absorptivity, one version of it: a way to results without a standard curve. */
export interface AbsorptivityRow extends Model<
  InferAttributes<AbsorptivityRow>,
  InferCreationAttributes<AbsorptivityRow>
> {
  id: CreationOptional<string>;
  notebookId: string;
  lineageId: string;
  version: number;
  supersedesId: string | null;
  title: string;
  status: 'saved' | 'superseded' | 'void';
  analyte: string;
  /** What the concentration counts, for example "Fe"; its formula mass beside it, g/mol. */
  basis: string;
  formulaMass: number | null;
  unit: string;
  /** In which readings are typed; a reading from a spectrum is an absorbance. */
  signal: Signal;
  kind: AbsorptivityKind;
  /** ε in L/(mol cm); E(1 %, 1 cm); a in L/(g cm). Its standard uncertainty beside it, null when none was stated. */
  value: number;
  u: number | null;
  /** Where the value comes from; never empty. */
  source: string;
  /** Solvent, acidity, temperature, bandwidth it holds for. */
  conditions: string;
  wavelengthNm: number;
  readingRule: ReadingRule;
  pathLengthMm: number;
  pathLengthUMm: number | null;
  /** Standard deviation of one reading, known beforehand. */
  readingSd: number | null;
  confidence: number;
  absorbanceLimit: number;
  hazardNote: string;
  /** Why this version was made; null for a first one. */
  reason: CreationOptional<string | null>;
  voidReason: CreationOptional<string | null>;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineAbsorptivity = (sequelize: Sequelize) =>
  sequelize.define<AbsorptivityRow>(
    'Absorptivity',
    columns({
      id,
      notebookId: reference,
      lineageId: reference,
      version: whole,
      supersedesId: optionalReference,
      title: text,
      status: text,
      analyte: text,
      basis: text,
      formulaMass: optionalReal,
      unit: text,
      signal: text,
      kind: text,
      value: real,
      u: optionalReal,
      source: text,
      conditions: text,
      wavelengthNm: real,
      readingRule: json,
      pathLengthMm: real,
      pathLengthUMm: optionalReal,
      readingSd: optionalReal,
      confidence: real,
      absorbanceLimit: real,
      hazardNote: text,
      reason: optionalText,
      voidReason: optionalText,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'absorptivities', underscored: true },
  );
