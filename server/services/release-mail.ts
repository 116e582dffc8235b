import type { Transaction } from 'sequelize';
import type { Deps } from '../deps.ts';
import { post } from '../mail/outbox.ts';
import { stopLink } from '../mail/stop-link.ts';
import { Membership, type Project, type Run } from '../models/index.ts';

const VERBS = {
  asked: 'asks for the release of',
  released: 'released',
  withdrawn: 'withdrew the release of',
} as const;

/** Mail about a release to everybody in the project who wants it, but for who did it. */
export async function tellOfRelease(
  what: keyof typeof VERBS,
  run: Run,
  by: { id: number; name: string },
  reason: string | null,
  project: Project,
  deps: Deps,
  transaction: Transaction,
): Promise<void> {
  const members = await Membership.findAll({
    where: { projectId: project.id },
    include: { association: 'person', where: { active: true, mailReleases: true } },
    transaction,
  });
  const named = `${run.assembly}, ${run.state}, at ${run.commit?.slice(0, 9) ?? run.at.toISOString().slice(0, 16)}`;
  for (const { person } of members) {
    if (person!.id === by.id) continue;
    await post(
      {
        to: person!.email,
        subject: `${by.name} ${VERBS[what]} ${run.assembly}, ${run.state}`,
        text: [
          `In ${project.name}, ${by.name} ${VERBS[what]} ${named}.`,
          ...(reason ? [`Reason: ${reason}`] : []),
          `The run: ${deps.config.PUBLIC_URL}/projects/${project.slug}/runs/${run.id}`,
        ],
        stop: stopLink(person!, deps.config),
      },
      deps,
      transaction,
    );
  }
}
