import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** A file that a record was computed from, by its hash, packed with gzip. */
export class Input extends Model<InferAttributes<Input>, InferCreationAttributes<Input>> {
  declare id: CreationOptional<string>;
  declare projectId: number;
  declare sha256: string;
  /** Unpacked, in bytes. */
  declare size: number;
  declare content: Buffer;
  declare createdAt: CreationOptional<Date>;

  static map(sequelize: Sequelize): void {
    const { bigId, integer, text, big, bytes, now } = column;
    initModel(
      Input,
      'inputs',
      {
        id: bigId,
        projectId: integer,
        sha256: { ...text, field: 'sha256' },
        size: big,
        content: bytes,
        createdAt: now,
      },
      sequelize,
    );
  }
}
