import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { Role } from '@/lib/policies/actor';
import { flag, id, moment, optionalMoment, optionalText, reference, text, columns } from './columns';

type Row<T extends Model> = Model<InferAttributes<T>, InferCreationAttributes<T>>;

export interface LaboratoryRow extends Row<LaboratoryRow> {
  id: CreationOptional<string>;
  name: string;
  timeZone: string;
  /** Written once, when the database is made: whether everything in it is invented. */
  demo: boolean;
  createdAt: CreationOptional<Date>;
}
export const defineLaboratory = (sequelize: Sequelize) =>
  sequelize.define<LaboratoryRow>(
    'Laboratory',
    columns({ id, name: text, timeZone: text, demo: flag, createdAt: moment }),
    { tableName: 'laboratories', underscored: true },
  );

export interface PersonRow extends Row<PersonRow> {
  id: CreationOptional<string>;
  name: string;
  email: string;
  passwordHash: string | null;
  role: Role;
  active: CreationOptional<boolean>;
  /** When this person read the statements of limits for the first time. */
  welcomedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}
export const definePerson = (sequelize: Sequelize) =>
  sequelize.define<PersonRow>(
    'Person',
    columns({
      id,
      name: text,
      email: text,
      passwordHash: optionalText,
      role: text,
      active: { ...flag, defaultValue: true },
      welcomedAt: optionalMoment,
      createdAt: moment,
    }),
    { tableName: 'people', underscored: true },
  );

export interface SessionRow extends Row<SessionRow> {
  id: CreationOptional<string>;
  personId: string;
  lastSeenAt: Date;
  idleExpiresAt: Date;
  expiresAt: Date;
  endedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}
export const defineSession = (sequelize: Sequelize) =>
  sequelize.define<SessionRow>(
    'Session',
    columns({
      id,
      personId: reference,
      lastSeenAt: moment,
      idleExpiresAt: moment,
      expiresAt: moment,
      endedAt: optionalMoment,
      createdAt: moment,
    }),
    { tableName: 'sessions', underscored: true },
  );

export interface PasswordLinkRow extends Row<PasswordLinkRow> {
  id: CreationOptional<string>;
  personId: string;
  tokenHash: string;
  purpose: 'invitation' | 'reset';
  expiresAt: Date;
  usedAt: CreationOptional<Date | null>;
  withdrawnAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}
export const definePasswordLink = (sequelize: Sequelize) =>
  sequelize.define<PasswordLinkRow>(
    'PasswordLink',
    columns({
      id,
      personId: reference,
      tokenHash: text,
      purpose: text,
      expiresAt: moment,
      usedAt: optionalMoment,
      withdrawnAt: optionalMoment,
      createdAt: moment,
    }),
    { tableName: 'password_links', underscored: true },
  );

export interface ApiTokenRow extends Row<ApiTokenRow> {
  id: CreationOptional<string>;
  personId: string;
  name: string;
  tokenHash: string;
  scope: 'read' | 'write';
  expiresAt: Date;
  revokedAt: CreationOptional<Date | null>;
  lastUsedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}
export const defineApiToken = (sequelize: Sequelize) =>
  sequelize.define<ApiTokenRow>(
    'ApiToken',
    columns({
      id,
      personId: reference,
      name: text,
      tokenHash: text,
      scope: text,
      expiresAt: moment,
      revokedAt: optionalMoment,
      lastUsedAt: optionalMoment,
      createdAt: moment,
    }),
    { tableName: 'api_tokens', underscored: true },
  );
