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
  /** Names as they were: they stay on the release. */
  declare preparedName: string;
  declare preparedAt: CreationOptional<Date>;
  declare checkedBy: CreationOptional<number | null>;
  declare checkedName: CreationOptional<string | null>;
  declare checkedAt: CreationOptional<Date | null>;
  declare approvedBy: CreationOptional<number | null>;
  declare approvedName: CreationOptional<string | null>;
  declare approvedAt: CreationOptional<Date | null>;
  declare reason: CreationOptional<string | null>;
  declare withdrawnBy: CreationOptional<number | null>;
  declare withdrawnName: CreationOptional<string | null>;
  declare withdrawnAt: CreationOptional<Date | null>;
  declare withdrawnReason: CreationOptional<string | null>;

  static map(sequelize: Sequelize): void {
    const { id, integer, big, now, text, maybeInteger, maybeDate, maybeText } = column;
    initModel(
      Release,
      'releases',
      {
        id,
        projectId: integer,
        runId: big,
        state: { type: DataTypes.TEXT, allowNull: false },
        preparedBy: integer,
        preparedName: text,
        preparedAt: now,
        checkedBy: maybeInteger,
        checkedName: maybeText,
        checkedAt: maybeDate,
        approvedBy: maybeInteger,
        approvedName: maybeText,
        approvedAt: maybeDate,
        reason: maybeText,
        withdrawnBy: maybeInteger,
        withdrawnName: maybeText,
        withdrawnAt: maybeDate,
        withdrawnReason: maybeText,
      },
      sequelize,
    );
  }
}
