import {
  DataTypes,
  type InitOptions,
  type Model,
  type ModelAttributeColumnOptions,
  type Sequelize,
} from 'sequelize'

type Column = ModelAttributeColumnOptions

/** Random id made here, so that it is known before the row is written. */
export const key = (): Column => ({ type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 })
/** Id handed in as text. */
export const textKey = (): Column => ({ type: DataTypes.TEXT, primaryKey: true })
/** The key of a table that has one row. */
export const oneRow = (): Column => ({ type: DataTypes.INTEGER, primaryKey: true, defaultValue: 1 })
/** Id of another row; the foreign key is the migration's. */
export const ref = (): Column => ({ type: DataTypes.UUID, allowNull: false })
export const text = (): Column => ({ type: DataTypes.TEXT, allowNull: false })
export const texts = (): Column => ({ type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false })
export const whole = (): Column => ({ type: DataTypes.INTEGER, allowNull: false })
/** Whole number above 2³¹; comes back as a safe integer (lib/db/sequelize). */
export const bigWhole = (): Column => ({ type: DataTypes.BIGINT, allowNull: false })
/** Number the database counts up itself. */
export const counted = (): Column => ({
  type: DataTypes.BIGINT,
  allowNull: false,
  autoIncrementIdentity: true,
  autoIncrement: true,
})
/** Whole minor units. */
export const money = (): Column => ({ type: DataTypes.BIGINT, allowNull: false })
/** Exact decimal; comes back as a string. */
export const decimal = (digits: number, places: number): Column => ({
  type: DataTypes.DECIMAL(digits, places),
  allowNull: false,
})
/** Calendar day 'YYYY-MM-DD'. */
export const day = (): Column => ({ type: DataTypes.DATEONLY, allowNull: false })
/** Instant. */
export const moment = (): Column => ({ type: DataTypes.DATE, allowNull: false })
export const flag = (): Column => ({ type: DataTypes.BOOLEAN, allowNull: false })
export const json = (): Column => ({ type: DataTypes.JSONB, allowNull: false })

/** Bytes as they came. */
export const bytes = (): Column => ({ type: DataTypes.BLOB, allowNull: false })

export const optional = (column: Column): Column => ({ ...column, allowNull: true })
/** The same default as in the migration. */
export const preset = (column: Column, value: unknown): Column => ({ ...column, defaultValue: value })

/** Names are given by hand: class names are shortened in a production build. */
export function table<M extends Model>(
  sequelize: Sequelize,
  modelName: string,
  tableName: string,
): InitOptions<M> {
  return { sequelize, modelName, tableName, underscored: true, timestamps: false }
}
