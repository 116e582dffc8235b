import type { Transaction } from 'sequelize';
import { AuditEntry } from '../models/index.ts';

/** What is noted of a change of rights, release, token, or of a deletion; never to be changed after. */
export interface Audited {
  readonly who: string;
  /** Such as `release.made`. */
  readonly action: string;
  readonly project: string | null;
  /** A sentence. */
  readonly what: string;
  readonly address: string | null;
}

/** Written in the transaction of the change: both or neither. */
export async function audit(entry: Audited, transaction: Transaction): Promise<void> {
  await AuditEntry.create({ ...entry }, { transaction });
}
