import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';
import type { Person } from './person.ts';

export class Comment extends Model<InferAttributes<Comment>, InferCreationAttributes<Comment>> {
  declare id: CreationOptional<number>;
  declare projectId: number;
  declare runId: string;
  declare personId: number;
  declare text: string;
  declare createdAt: CreationOptional<Date>;
  declare person?: NonAttribute<Person>;

  static map(sequelize: Sequelize): void {
    const { id, integer, big, text, now } = column;
    initModel(
      Comment,
      'comments',
      { id, projectId: integer, runId: big, personId: integer, text, createdAt: now },
      sequelize,
    );
  }
}
