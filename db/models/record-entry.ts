import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';
import { moment, optionalJson, optionalReference, optionalText, text, columns } from './columns';

/** Who changed what, when, from what to what, and why. There is no way to change or remove one. */
export interface RecordEntryRow extends Model<
  InferAttributes<RecordEntryRow>,
  InferCreationAttributes<RecordEntryRow>
> {
  id: CreationOptional<number>;
  at: Date;
  actorKind: string;
  actorVia: string;
  personId: string | null;
  actorName: string;
  notebookId: string | null;
  kind: string;
  subjectId: string | null;
  subjectName: string | null;
  verb: string;
  from: Record<string, unknown> | null;
  to: Record<string, unknown> | null;
  why: string | null;
}
export const defineRecordEntry = (sequelize: Sequelize) =>
  sequelize.define<RecordEntryRow>(
    'RecordEntry',
    columns({
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      at: moment,
      actorKind: text,
      actorVia: text,
      personId: optionalReference,
      actorName: text,
      notebookId: optionalReference,
      kind: text,
      subjectId: optionalReference,
      subjectName: optionalText,
      verb: text,
      from: optionalJson,
      to: optionalJson,
      why: optionalText,
    }),
    { tableName: 'record_entries', underscored: true, timestamps: false },
  );
