import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { Gap, ReadOptions, ReaderWarning, SignalKind, XUnit } from '@/lib/readers/types';
import {
  flag,
  id,
  json,
  moment,
  optionalMoment,
  optionalReal,
  optionalText,
  real,
  reference,
  text,
  whole,
  columns,
} from './columns';

type Row<T extends Model> = Model<InferAttributes<T>, InferCreationAttributes<T>>;

export interface SourceFileRow extends Row<SourceFileRow> {
  id: CreationOptional<string>;
  notebookId: string;
  name: string;
  /** Of the bytes as they came, before compression. */
  sha256: string;
  sizeBytes: number;
  reader: string;
  readerVersion: string;
  dialect: string;
  /** Handed back to the reader, they give the same reading. */
  settings: ReadOptions;
  headerText: string;
  trailerText: string;
  warnings: ReaderWarning[];
  spectrumCount: number;
  /** Of all its spectra together. */
  pointCount: number;
  createdById: string;
  voidedAt: CreationOptional<Date | null>;
  voidReason: CreationOptional<string | null>;
  createdAt: CreationOptional<Date>;
}
export const defineSourceFile = (sequelize: Sequelize) =>
  sequelize.define<SourceFileRow>(
    'SourceFile',
    columns({
      id,
      notebookId: reference,
      name: text,
      sha256: text,
      sizeBytes: whole,
      reader: text,
      readerVersion: text,
      dialect: text,
      settings: json,
      headerText: text,
      trailerText: text,
      warnings: json,
      spectrumCount: whole,
      pointCount: whole,
      createdById: reference,
      voidedAt: optionalMoment,
      voidReason: optionalText,
      createdAt: moment,
    }),
    { tableName: 'source_files', underscored: true },
  );

/** One spectrum of a source file. Its points stand in spectrum_points, as the file gave them. */
export interface SpectrumRow extends Row<SpectrumRow> {
  id: CreationOptional<string>;
  notebookId: string;
  sourceFileId: string;
  name: string;
  position: number;
  block: number;
  line: number;
  xUnit: XUnit;
  xUnitGuessed: boolean;
  signal: SignalKind;
  signalGuessed: boolean;
  signalText: string;
  /** An ordinate times this is in the unit of `signal`. */
  signalScale: number;
  pointCount: number;
  gapCount: number;
  fromNm: number;
  toNm: number;
  highestAbsorbance: number | null;
  pathLengthMm: number | null;
  header: Record<string, string>;
  gaps: Gap[];
  warnings: ReaderWarning[];
  createdById: string;
  voidedAt: CreationOptional<Date | null>;
  voidReason: CreationOptional<string | null>;
  createdAt: CreationOptional<Date>;
}
export const defineSpectrum = (sequelize: Sequelize) =>
  sequelize.define<SpectrumRow>(
    'Spectrum',
    columns({
      id,
      notebookId: reference,
      sourceFileId: reference,
      name: text,
      position: whole,
      block: whole,
      line: whole,
      xUnit: text,
      xUnitGuessed: flag,
      signal: text,
      signalGuessed: flag,
      signalText: text,
      signalScale: real,
      pointCount: whole,
      gapCount: whole,
      fromNm: real,
      toNm: real,
      highestAbsorbance: optionalReal,
      pathLengthMm: optionalReal,
      header: json,
      gaps: json,
      warnings: json,
      createdById: reference,
      voidedAt: optionalMoment,
      voidReason: optionalText,
      createdAt: moment,
    }),
    { tableName: 'spectra', underscored: true },
  );
