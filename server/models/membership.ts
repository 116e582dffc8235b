import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';
import type { Person } from './person.ts';
import type { Project } from './project.ts';

export type MemberRole = 'viewer' | 'engineer' | 'approver';

/** A person's role in a project. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare projectId: number;
  declare personId: number;
  declare role: MemberRole;
  declare createdAt: CreationOptional<Date>;
  declare person?: NonAttribute<Person>;
  declare project?: NonAttribute<Project>;

  static map(sequelize: Sequelize): void {
    const { integer, now } = column;
    initModel(
      Membership,
      'memberships',
      {
        projectId: { ...integer, primaryKey: true },
        personId: { ...integer, primaryKey: true },
        role: { type: DataTypes.ENUM('viewer', 'engineer', 'approver'), allowNull: false },
        createdAt: now,
      },
      sequelize,
    );
  }
}
