import { QueryTypes, type Transaction } from 'sequelize';
import { displayUnits, printLimit, unitOfLimit } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { isBroken } from '#core/record/waiver-state.ts';
import type { Deps } from '../deps.ts';
import { post } from '../mail/outbox.ts';
import { stopLink } from '../mail/stop-link.ts';
import { Membership, type Project } from '../models/index.ts';

/** Mail to whoever wants it when a limit breaks that the run before it on the same watched branch held. */
export async function tellOfLimits(
  run: string,
  record: RollUpRecord,
  project: Project,
  deps: Deps,
  transaction: Transaction,
): Promise<void> {
  const branch = record.provenance.branch ?? '';
  const today = new Date().toISOString().slice(0, 10);
  const broken = record.limits.filter((limit) => isBroken(limit, today));
  if (broken.length === 0 || !project.watchedBranches.includes(branch)) return;
  const [before] = await deps.sequelize.query<{ outside: string[] }>(
    `SELECT outside FROM runs WHERE project_id = $1 AND assembly = $2 AND state = $3 AND branch = $4 AND id <> $5
     ORDER BY at DESC, id DESC LIMIT 1`,
    { bind: [project.id, record.assembly, record.state, branch, run], type: QueryTypes.SELECT, transaction },
  );
  const news = broken.filter((limit) => !before?.outside.includes(limit.name));
  if (news.length === 0) return;
  const units = displayUnits(record);
  const lines = news.map((limit) => {
    const { value, unit, words } = printLimit(limit, unitOfLimit(limit, units));
    const by = limit.heaviest[0];
    return `- ${limit.name}: ${value} ${unit}, ${words}${by ? `; most of it by ${by.path} (${by.at.file}:${by.at.line})` : ''}`;
  });
  const { commit, author } = record.provenance;
  const members = await Membership.findAll({
    where: { projectId: project.id },
    include: { association: 'person', where: { active: true, mailLimits: true } },
    transaction,
  });
  for (const { person } of members)
    await post(
      {
        to: person!.email,
        subject: `${record.assembly}, ${record.state}: ${news.map((n) => n.name).join(', ')} outside on ${branch}`,
        text: [
          `In ${project.name}, ${record.assembly} in state ${record.state} went outside on ${branch}${commit ? ` with commit ${commit.slice(0, 9)}${author ? ` by ${author}` : ''}` : ''}:`,
          lines.join('\n'),
          `The run: ${deps.config.PUBLIC_URL}/projects/${project.slug}/runs/${run}`,
        ],
        stop: stopLink(person!, deps.config),
      },
      deps,
      transaction,
    );
}
