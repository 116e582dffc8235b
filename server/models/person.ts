import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** Someone with an account; nobody is removed, for their names stay on what they did: accounts are shut. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<number>;
  /** In small letters. */
  declare email: string;
  declare name: string;
  declare passwordHash: string | null;
  declare administrator: CreationOptional<boolean>;
  declare active: CreationOptional<boolean>;
  declare mailLimits: CreationOptional<boolean>;
  declare mailReleases: CreationOptional<boolean>;
  declare lastSeenAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;

  static map(sequelize: Sequelize): void {
    const { id, text, maybeText, no, yes, maybeDate, now } = column;
    initModel(
      Person,
      'people',
      {
        id,
        email: text,
        name: text,
        passwordHash: maybeText,
        administrator: no,
        active: yes,
        mailLimits: yes,
        mailReleases: yes,
        lastSeenAt: maybeDate,
        createdAt: now,
      },
      sequelize,
    );
  }
}
