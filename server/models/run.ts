import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Provenance } from '#core/record/record.ts';
import { column, initModel } from './model.ts';

/** A record as it came from one commit, or outside git from one push; what the history shows stands in columns. */
export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  declare id: CreationOptional<string>;
  declare projectId: number;
  declare recordId: string;
  /** `commit:<sha>` or `push:<key>`: one record from one origin is one run. */
  declare origin: string;
  declare assembly: string;
  declare state: string;
  /** '' where none is known. */
  declare branch: string;
  declare verdict: 'within' | 'outside' | 'unlimited';
  declare at: CreationOptional<Date>;
  declare commit: string | null;
  declare tag: string | null;
  declare dirty: boolean;
  declare author: string | null;
  declare personId: number;
  declare tokenId: number | null;
  declare judgedOn: 'basic' | 'predicted';
  /** [kg], as judged. */
  declare mass: number;
  /** [mass, centre x y z, Ixx Iyy Izz about the centre, principal moments ascending], SI; mass alone without a centre. */
  declare figures: number[];
  declare nearest: string[] | null;
  declare outside: string[];
  declare fileUnits: { length: string; mass: string; inertia: string };
  declare provenance: Provenance;
  declare release: CreationOptional<'asked' | 'released' | 'withdrawn' | null>;

  static map(sequelize: Sequelize): void {
    const { bigId, integer, maybeInteger, big, text, maybeText, no, number, json } = column;
    initModel(
      Run,
      'runs',
      {
        id: bigId,
        projectId: integer,
        recordId: big,
        origin: text,
        assembly: text,
        state: text,
        branch: text,
        verdict: { type: DataTypes.TEXT, allowNull: false },
        at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        commit: maybeText,
        tag: maybeText,
        dirty: no,
        author: maybeText,
        personId: integer,
        tokenId: maybeInteger,
        judgedOn: { type: DataTypes.TEXT, allowNull: false },
        mass: number,
        figures: { type: DataTypes.ARRAY(DataTypes.DOUBLE), allowNull: false },
        nearest: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: true },
        outside: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] },
        fileUnits: json,
        provenance: json,
        release: { type: DataTypes.TEXT, allowNull: true },
      },
      sequelize,
    );
  }
}
