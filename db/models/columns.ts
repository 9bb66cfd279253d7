import { randomUUID } from 'node:crypto';
import { DataTypes } from 'sequelize';

/** Columns that every table has in the same shape. */
export const id = { type: DataTypes.UUID, primaryKey: true, defaultValue: () => randomUUID() } as const;
export const text = { type: DataTypes.TEXT, allowNull: false } as const;
export const optionalText = { type: DataTypes.TEXT, allowNull: true } as const;
export const real = { type: DataTypes.DOUBLE, allowNull: false } as const;
export const optionalReal = { type: DataTypes.DOUBLE, allowNull: true } as const;
export const whole = { type: DataTypes.INTEGER, allowNull: false } as const;
export const flag = { type: DataTypes.BOOLEAN, allowNull: false } as const;
export const moment = { type: DataTypes.DATE, allowNull: false } as const;
export const optionalMoment = { type: DataTypes.DATE, allowNull: true } as const;
export const json = { type: DataTypes.JSON, allowNull: false } as const;
export const optionalJson = { type: DataTypes.JSON, allowNull: true } as const;
export const reference = { type: DataTypes.UUID, allowNull: false } as const;
export const optionalReference = { type: DataTypes.UUID, allowNull: true } as const;

/** Sequelize writes the column's name into each definition, so every column gets an object of its own. */
export function columns<T extends object>(attributes: T): T {
  return Object.fromEntries(Object.entries(attributes).map(([name, column]) => [name, { ...column }])) as T;
}
