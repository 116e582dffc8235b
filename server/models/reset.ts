import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** A link that sets a new password, once. */
export class Reset extends Model<InferAttributes<Reset>, InferCreationAttributes<Reset>> {
  declare id: CreationOptional<number>;
  declare personId: number;
  declare linkHash: string;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;

  static map(sequelize: Sequelize): void {
    const { id, integer, text, now, date, maybeDate } = column;
    initModel(
      Reset,
      'resets',
      { id, personId: integer, linkHash: text, createdAt: now, expiresAt: date, usedAt: maybeDate },
      sequelize,
    );
  }
}
