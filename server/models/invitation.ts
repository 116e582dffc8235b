import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import type { MemberRole } from './membership.ts';
import { column, initModel } from './model.ts';
import type { Person } from './person.ts';
import type { Project } from './project.ts';

/** A link that gives whoever has the mailbox a role, once. */
export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare id: CreationOptional<number>;
  declare projectId: number;
  declare email: string;
  declare role: MemberRole;
  declare invitedBy: number;
  declare linkHash: string;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare inviter?: NonAttribute<Person>;
  declare project?: NonAttribute<Project>;

  static map(sequelize: Sequelize): void {
    const { id, integer, text, now, date, maybeDate } = column;
    initModel(
      Invitation,
      'invitations',
      {
        id,
        projectId: integer,
        email: text,
        role: { type: DataTypes.ENUM('viewer', 'engineer', 'approver'), allowNull: false },
        invitedBy: integer,
        linkHash: text,
        createdAt: now,
        expiresAt: date,
        usedAt: maybeDate,
      },
      sequelize,
    );
  }
}
