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

/** What a command or a CI job shows instead of a password; its secret is kept as a hash alone. */
export class Token extends Model<InferAttributes<Token>, InferCreationAttributes<Token>> {
  declare id: CreationOptional<number>;
  declare projectId: number;
  /** Who made it, and whose it is where it is a person's. */
  declare personId: number;
  declare kind: 'person' | 'machine';
  declare label: string;
  declare scope: 'read' | 'push';
  declare secretHash: string;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare lastUsedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
  declare person?: NonAttribute<Person>;
  declare project?: NonAttribute<Project>;

  static map(sequelize: Sequelize): void {
    const { id, integer, text, now, date, maybeDate } = column;
    initModel(
      Token,
      'tokens',
      {
        id,
        projectId: integer,
        personId: integer,
        kind: { type: DataTypes.TEXT, allowNull: false },
        label: text,
        scope: { type: DataTypes.TEXT, allowNull: false },
        secretHash: text,
        createdAt: now,
        expiresAt: date,
        lastUsedAt: maybeDate,
        revokedAt: maybeDate,
      },
      sequelize,
    );
  }
}
