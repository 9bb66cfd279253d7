import type { CreationOptional, InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { MemberRole } from '@/lib/policies/actor';
import { id, moment, optionalMoment, reference, text, whole, columns } from './columns';

type Row<T extends Model> = Model<InferAttributes<T>, InferCreationAttributes<T>>;

export interface NotebookRow extends Row<NotebookRow> {
  id: CreationOptional<string>;
  title: string;
  purpose: string;
  ownerId: string;
  createdById: string;
  archivedAt: CreationOptional<Date | null>;
  version: CreationOptional<number>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}
export const defineNotebook = (sequelize: Sequelize) =>
  sequelize.define<NotebookRow>(
    'Notebook',
    columns({
      id,
      title: text,
      purpose: text,
      ownerId: reference,
      createdById: reference,
      archivedAt: optionalMoment,
      version: { ...whole, defaultValue: 1 },
      createdAt: moment,
      updatedAt: moment,
    }),
    { tableName: 'notebooks', underscored: true },
  );

export interface MembershipRow extends Row<MembershipRow> {
  id: CreationOptional<string>;
  notebookId: string;
  personId: string;
  role: MemberRole;
  endedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}
export const defineMembership = (sequelize: Sequelize) =>
  sequelize.define<MembershipRow>(
    'Membership',
    columns({
      id,
      notebookId: reference,
      personId: reference,
      role: text,
      endedAt: optionalMoment,
      createdAt: moment,
    }),
    { tableName: 'memberships', underscored: true },
  );

export interface ShareLinkRow extends Row<ShareLinkRow> {
  id: CreationOptional<string>;
  notebookId: string;
  label: string;
  tokenHash: string;
  expiresAt: Date;
  revokedAt: CreationOptional<Date | null>;
  openedCount: CreationOptional<number>;
  lastOpenedAt: CreationOptional<Date | null>;
  createdById: string;
  createdAt: CreationOptional<Date>;
}
export const defineShareLink = (sequelize: Sequelize) =>
  sequelize.define<ShareLinkRow>(
    'ShareLink',
    columns({
      id,
      notebookId: reference,
      label: text,
      tokenHash: text,
      expiresAt: moment,
      revokedAt: optionalMoment,
      openedCount: { ...whole, defaultValue: 0 },
      lastOpenedAt: optionalMoment,
      createdById: reference,
      createdAt: moment,
    }),
    { tableName: 'share_links', underscored: true },
  );

export interface ShareSessionRow extends Row<ShareSessionRow> {
  id: CreationOptional<string>;
  shareLinkId: string;
  expiresAt: Date;
}
export const defineShareSession = (sequelize: Sequelize) =>
  sequelize.define<ShareSessionRow>(
    'ShareSession',
    columns({ id, shareLinkId: reference, expiresAt: moment }),
    { tableName: 'share_sessions', underscored: true },
  );
