/** Columns that many tables share, written once. Those that may be empty start as null, so that a row just made reads like one read back. */
import { DataTypes, type ModelAttributeColumnOptions } from 'sequelize';
import { newPublicId } from '#server/db/public-id.ts';

export const id = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER.UNSIGNED, autoIncrement: true, primaryKey: true });
export const publicId = (): ModelAttributeColumnOptions => ({ type: DataTypes.CHAR(26), allowNull: false, defaultValue: newPublicId });
export const ref = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER.UNSIGNED, allowNull: false });
export const maybeRef = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER.UNSIGNED, allowNull: true, defaultValue: null });
export const count = (start = 0): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: start });
export const text = (length: number): ModelAttributeColumnOptions => ({ type: DataTypes.STRING(length), allowNull: false });
export const maybeText = (length: number): ModelAttributeColumnOptions => ({ type: DataTypes.STRING(length), allowNull: true, defaultValue: null });
export const longText = (): ModelAttributeColumnOptions => ({ type: DataTypes.TEXT('medium'), allowNull: false, defaultValue: '' });
export const moment = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATE(3), allowNull: false });
export const maybeMoment = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATE(3), allowNull: true, defaultValue: null });
export const yes = (start: boolean): ModelAttributeColumnOptions => ({ type: DataTypes.BOOLEAN, allowNull: false, defaultValue: start });
export const oneOf = (words: readonly string[], start?: string): ModelAttributeColumnOptions =>
  ({ type: DataTypes.ENUM(...words), allowNull: false, ...(start === undefined ? {} : { defaultValue: start }) });
export const json = (): ModelAttributeColumnOptions => ({ type: DataTypes.JSON, allowNull: false });
export const maybeJson = (): ModelAttributeColumnOptions => ({ type: DataTypes.JSON, allowNull: true, defaultValue: null });
