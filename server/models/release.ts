import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** A run on its way to be a baseline, as one, or no more one; the names stay. */
export class Release extends Model<InferAttributes<Release>, InferCreationAttributes<Release>> {
  declare id: CreationOptional<number>;
  declare projectId: number;
  declare runId: string;
  declare state: 'asked' | 'released' | 'withdrawn';
  declare preparedBy: number;
  declare preparedAt: CreationOptional<Date>;
  declare checkedBy: CreationOptional<number | null>;
  declare checkedAt: CreationOptional<Date | null>;
  declare approvedBy: CreationOptional<number | null>;
  declare approvedAt: CreationOptional<Date | null>;
  declare reason: CreationOptional<string | null>;
  declare withdrawnBy: CreationOptional<number | null>;
  declare withdrawnAt: CreationOptional<Date | null>;
  declare withdrawnReason: CreationOptional<string | null>;

  static map(sequelize: Sequelize): void {
    const { id, integer, big, now, maybeInteger, maybeDate, maybeText } = column;
    initModel(
      Release,
      'releases',
      {
        id,
        projectId: integer,
        runId: big,
        state: { type: DataTypes.TEXT, allowNull: false },
        preparedBy: integer,
        preparedAt: now,
        checkedBy: maybeInteger,
        checkedAt: maybeDate,
        approvedBy: maybeInteger,
        approvedAt: maybeDate,
        reason: maybeText,
        withdrawnBy: maybeInteger,
        withdrawnAt: maybeDate,
        withdrawnReason: maybeText,
      },
      sequelize,
    );
  }
}
