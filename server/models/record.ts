import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

export type RecomputationStatus = 'waiting' | 'recomputed' | 'differs' | 'not recomputable';

/** The content of one stamp, stored once: the record without provenance and without the texts of its inputs. */
export class StoredRecord extends Model<
  InferAttributes<StoredRecord>,
  InferCreationAttributes<StoredRecord>
> {
  declare id: CreationOptional<string>;
  declare projectId: number;
  declare stamp: string;
  /** Of the content before packing: two contents under one stamp are told apart by it. */
  declare contentSha256: string;
  /** JSON packed with gzip. */
  declare content: Buffer;
  declare recomputation: CreationOptional<RecomputationStatus>;
  declare recomputationDetail: CreationOptional<string | null>;
  declare recomputedAt: CreationOptional<Date | null>;
  /** The three views as SVG, drawn by the recomputation. */
  declare drawing: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;

  static map(sequelize: Sequelize): void {
    const { bigId, integer, text, bytes, maybeText, maybeDate, now } = column;
    initModel(
      StoredRecord,
      'records',
      {
        id: bigId,
        projectId: integer,
        stamp: text,
        contentSha256: { ...text, field: 'content_sha256' },
        content: bytes,
        recomputation: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'waiting' },
        recomputationDetail: maybeText,
        recomputedAt: maybeDate,
        drawing: maybeText,
        createdAt: now,
      },
      sequelize,
    );
  }
}
