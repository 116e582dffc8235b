import {
  DataTypes,
  type InitOptions,
  type Model,
  type ModelAttributes,
  type ModelStatic,
  type Sequelize,
} from 'sequelize';

/** Column kinds in short. */
export const column = {
  id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
  bigId: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
  text: { type: DataTypes.TEXT, allowNull: false },
  maybeText: { type: DataTypes.TEXT, allowNull: true },
  integer: { type: DataTypes.INTEGER, allowNull: false },
  maybeInteger: { type: DataTypes.INTEGER, allowNull: true },
  big: { type: DataTypes.BIGINT, allowNull: false },
  yes: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: true },
  no: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  date: { type: DataTypes.DATE, allowNull: false },
  now: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
  maybeDate: { type: DataTypes.DATE, allowNull: true },
  bytes: { type: DataTypes.BLOB, allowNull: false },
  number: { type: DataTypes.DOUBLE, allowNull: false },
  json: { type: DataTypes.JSONB, allowNull: false },
} as const;

/** Maps a model to its table; columns are the attributes with underscores, and the table keeps its own times. */
export function initModel<M extends Model>(
  model: ModelStatic<M>,
  tableName: string,
  attributes: ModelAttributes<M>,
  sequelize: Sequelize,
): void {
  const options: InitOptions<M> = { sequelize, tableName, underscored: true, timestamps: false };
  // Sequelize writes into what it is given; the kinds above are shared.
  const own = Object.fromEntries(
    Object.entries(attributes).map(([name, kind]) => [name, { ...(kind as object) }]),
  );
  model.init(own as never, options);
}
