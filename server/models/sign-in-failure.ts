import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** A wrong password for an account (known or not) from an address. */
export class SignInFailure extends Model<
  InferAttributes<SignInFailure>,
  InferCreationAttributes<SignInFailure>
> {
  declare id: CreationOptional<string>;
  declare account: string;
  declare address: string;
  declare at: CreationOptional<Date>;

  static map(sequelize: Sequelize): void {
    const { bigId, text, now } = column;
    initModel(
      SignInFailure,
      'sign_in_failures',
      { id: bigId, account: text, address: text, at: now },
      sequelize,
    );
  }
}
