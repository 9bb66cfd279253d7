import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { CurveAnswer, ReadingRule, Signal } from '@/lib/engine';
import {
  flag,
  id,
  json,
  optionalJson,
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

type Row<T extends Model> = Model<InferAttributes<T>, InferCreationAttributes<T>>;

export interface MethodRow extends Row<MethodRow> {
  id: CreationOptional<string>;
  notebookId: string;
  lineageId: string;
  version: number;
  supersedesId: string | null;
  analyte: string;
  /** What the concentration counts, for example "Fe" or "as N"; its formula mass beside it, g/mol. */
  basis: string;
  formulaMass: number | null;
  unit: string;
  /** In which readings are typed; a reading from a spectrum is an absorbance. */
  signal: Signal;
  wavelengthNm: number;
  readingRule: ReadingRule;
  pathLengthMm: number;
  pathLengthUMm: number | null;
  /** False when the path is an assumption: then no molar absorptivity is claimed. */
  pathLengthKnown: boolean;
  /** Of what all standards share: stock, purity, common ware. */
  standardsRelativeU: number | null;
  blankRule: 'none' | 'level' | 'subtract';
  model: 'linear' | 'proportional' | 'quadratic';
  weighting: string;
  /** Of weights by a variance function, s² = s0² + (k A)²; null for others. */
  varianceFunction: CreationOptional<{ s0: number; k: number } | null>;
  confidence: number;
  absorbanceLimit: number;
  limits: Record<string, number>;
  hazardNote: string;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineMethod = (sequelize: Sequelize) =>
  sequelize.define<MethodRow>(
    'Method',
    columns({
      id,
      notebookId: reference,
      lineageId: reference,
      version: whole,
      supersedesId: optionalReference,
      analyte: text,
      basis: text,
      formulaMass: optionalReal,
      unit: text,
      signal: text,
      wavelengthNm: real,
      readingRule: json,
      pathLengthMm: real,
      pathLengthUMm: optionalReal,
      pathLengthKnown: flag,
      standardsRelativeU: optionalReal,
      blankRule: text,
      model: text,
      weighting: text,
      varianceFunction: optionalJson,
      confidence: real,
      absorbanceLimit: real,
      limits: json,
      hazardNote: text,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'methods', underscored: true },
  );

export interface CurveRow extends Row<CurveRow> {
  id: CreationOptional<string>;
  notebookId: string;
  methodId: string;
  lineageId: string;
  version: number;
  supersedesId: string | null;
  title: string;
  status: 'saved' | 'superseded' | 'void';
  /** What the engine answered on the server when this version was saved. */
  result: CurveAnswer;
  engineVersion: string;
  /** Why this version was made; null for a first one. */
  reason: CreationOptional<string | null>;
  voidReason: CreationOptional<string | null>;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineCurve = (sequelize: Sequelize) =>
  sequelize.define<CurveRow>(
    'Curve',
    columns({
      id,
      notebookId: reference,
      methodId: reference,
      lineageId: reference,
      version: whole,
      supersedesId: optionalReference,
      title: text,
      status: text,
      result: json,
      engineVersion: text,
      reason: optionalText,
      voidReason: optionalText,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'curves', underscored: true },
  );

/** A standard of a curve, or a blank (concentration 0, used as the method's blank rule says). */
export interface StandardRow extends Row<StandardRow> {
  id: CreationOptional<string>;
  notebookId: string;
  curveId: string;
  role: 'standard' | 'blank';
  position: number;
  name: string;
  concentration: number;
  pathLengthMm: number;
  excludedReason: string | null;
}
export const defineStandard = (sequelize: Sequelize) =>
  sequelize.define<StandardRow>(
    'Standard',
    columns({
      id,
      notebookId: reference,
      curveId: reference,
      role: text,
      position: whole,
      name: text,
      concentration: real,
      pathLengthMm: real,
      excludedReason: optionalText,
    }),
    { tableName: 'standards', underscored: true },
  );
