import { Op } from 'sequelize';
import { AuditEntry } from '../../models/index.ts';
import { largeNumber } from '../numbers.ts';
import type { Handler } from '../route.ts';

const PAGE = 100;

const listAudit: Handler<'listAudit'> = async ({ query }) => {
  const where = query.cursor ? { id: { [Op.lt]: largeNumber(query.cursor) } } : {};
  const found = await AuditEntry.findAll({ where, order: [['id', 'DESC']], limit: PAGE + 1 });
  const entries = found.slice(0, PAGE).map(({ id, at, who, action, project, what, address }) => ({
    id: String(id),
    at: at.toISOString(),
    who,
    action,
    project,
    what,
    address,
  }));
  return { entries, next: found.length > PAGE ? entries.at(-1)!.id : null };
};

export const auditRoutes = { listAudit };
