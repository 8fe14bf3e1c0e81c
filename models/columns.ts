import { DataTypes, type ModelAttributeColumnOptions } from 'sequelize';
import { v7 } from 'uuid';

export const primaryUuid = (): ModelAttributeColumnOptions => ({
  type: DataTypes.UUID,
  primaryKey: true,
  defaultValue: () => v7(),
});

export const uuid = (): ModelAttributeColumnOptions => ({ type: DataTypes.UUID, allowNull: false });
export const text = (): ModelAttributeColumnOptions => ({ type: DataTypes.TEXT, allowNull: false });
export const integer = (): ModelAttributeColumnOptions => ({ type: DataTypes.INTEGER, allowNull: false });
export const json = (): ModelAttributeColumnOptions => ({ type: DataTypes.JSONB, allowNull: false });
export const time = (): ModelAttributeColumnOptions => ({ type: DataTypes.DATE, allowNull: false });
export const optional = (column: ModelAttributeColumnOptions): ModelAttributeColumnOptions => ({
  ...column,
  allowNull: true,
});

/** PostgreSQL gives bigint as text; milliseconds since 1970 fit a double exactly until the year 287396. */
export const milliseconds = (field: string): ModelAttributeColumnOptions => ({
  type: DataTypes.BIGINT,
  allowNull: false,
  get(this: { getDataValue(name: string): unknown }) {
    return Number(this.getDataValue(field));
  },
});
