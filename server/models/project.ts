import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** What a team keeps together: its runs, people and tokens. */
export class Project extends Model<InferAttributes<Project>, InferCreationAttributes<Project>> {
  declare id: CreationOptional<number>;
  declare slug: string;
  declare name: string;
  declare watchedBranches: CreationOptional<string[]>;
  declare createdAt: CreationOptional<Date>;

  static map(sequelize: Sequelize): void {
    const { id, text, now } = column;
    const watchedBranches = {
      type: DataTypes.ARRAY(DataTypes.TEXT),
      allowNull: false,
      defaultValue: ['main'],
    };
    initModel(
      Project,
      'projects',
      { id, slug: text, name: text, watchedBranches, createdAt: now },
      sequelize,
    );
  }
}
