import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** A message that waits to be sent, written in the transaction of what it tells of. */
export class Mail extends Model<InferAttributes<Mail>, InferCreationAttributes<Mail>> {
  declare id: CreationOptional<string>;
  declare recipient: string;
  declare subject: string;
  declare text: string;
  declare headers: CreationOptional<Record<string, string>>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
  declare failure: CreationOptional<string | null>;

  static map(sequelize: Sequelize): void {
    const { bigId, text, json, now, maybeDate, maybeText } = column;
    initModel(
      Mail,
      'mails',
      {
        id: bigId,
        recipient: text,
        subject: text,
        text,
        headers: { ...json, defaultValue: {} },
        createdAt: now,
        sentAt: maybeDate,
        failure: maybeText,
      },
      sequelize,
    );
  }
}
