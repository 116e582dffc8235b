import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** One browser's sign-in. The cookie names it; it ends the moment that it is revoked here. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string;
  declare personId: number;
  declare agent: string;
  declare createdAt: CreationOptional<Date>;
  declare seenAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;

  static map(sequelize: Sequelize): void {
    const { integer, text, now, date, maybeDate } = column;
    initModel(
      Session,
      'sessions',
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        personId: integer,
        agent: text,
        createdAt: now,
        seenAt: now,
        expiresAt: date,
        revokedAt: maybeDate,
      },
      sequelize,
    );
  }
}
