import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import { column, initModel } from './model.ts';

/** One change of rights, release, token or a deletion; the database refuses to change or remove it. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare id: CreationOptional<string>;
  declare at: CreationOptional<Date>;
  declare who: string;
  declare action: string;
  declare project: string | null;
  declare what: string;
  declare address: string | null;

  static map(sequelize: Sequelize): void {
    const { bigId, now, text, maybeText } = column;
    initModel(
      AuditEntry,
      'audit_entries',
      { id: bigId, at: now, who: text, action: text, project: maybeText, what: text, address: maybeText },
      sequelize,
    );
  }
}
