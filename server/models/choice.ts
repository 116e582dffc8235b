import {
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** What a project's history can be filtered by: every assembly, state and branch that ever came. */
export class Choice extends Model<InferAttributes<Choice>, InferCreationAttributes<Choice>> {
  declare projectId: number;
  declare kind: 'assembly' | 'state' | 'branch';
  declare value: string;

  static map(sequelize: Sequelize): void {
    const key = { type: DataTypes.TEXT, allowNull: false, primaryKey: true };
    initModel(
      Choice,
      'choices',
      { projectId: { ...column.integer, primaryKey: true }, kind: key, value: key },
      sequelize,
    );
  }
}
