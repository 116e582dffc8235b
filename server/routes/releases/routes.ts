import type { Transaction } from 'sequelize';
import type { RouteName } from '#core/api/routes.ts';
import type { Release as ReleaseAnswer } from '#core/api/runs.ts';
import { isBroken } from '#core/record/waiver-state.ts';
import { inTransaction } from '../../database.ts';
import { nameOf } from '../../middleware/caller.ts';
import { Release, Run } from '../../models/index.ts';
import { badRequest, conflict } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { tellOfRelease } from '../../services/release-mail.ts';
import { type Against, presentRelease, reasonsAgainst } from '../../services/releases.ts';
import { findRun, type WholeRun } from '../../services/run-detail.ts';
import { largeNumber } from '../numbers.ts';
import type { AskedInProject, Handler } from '../route.ts';

type Act = keyof Against;

interface Step {
  /** The release row, locked; null where there is none yet. */
  readonly release: Release | null;
  readonly whole: WholeRun;
  readonly transaction: Transaction;
}

/** One step of a release: the rules, the row, what the history shows, the audit trail and the mail, all or nothing. */
async function step<N extends RouteName>(
  act: Act,
  asked: AskedInProject<N>,
  take: (step: Step) => Promise<{ release: Release; action: string; what: string; reason: string | null }>,
): Promise<ReleaseAnswer> {
  const { caller, access, places, address, deps } = asked;
  const release = await inTransaction(deps.sequelize, async (transaction) => {
    const whole = await findRun(access.project.id, largeNumber(places.run));
    // The run's row is the lock: two people who press at once take turns.
    await Run.findByPk(whole.run.id, { lock: transaction.LOCK.UPDATE, transaction });
    const before = await Release.findOne({ where: { runId: whole.run.id }, transaction });
    const why = reasonsAgainst(whole, before, caller, access)[act];
    if (why) throw conflict('RELEASE_NOT_NOW', why, 'the page of the run says what may be done, and by whom');
    const done = await take({ release: before, whole, transaction });
    const { state } = done.release;
    await Run.update({ release: state }, { where: { id: whole.run.id }, transaction });
    const entry = { who: nameOf(caller), action: done.action, project: access.project.slug, address };
    const named = `${whole.run.assembly}, ${whole.run.state}, run ${whole.run.id}`;
    await audit(
      { ...entry, what: `${done.what} ${named}${done.reason ? `: ${done.reason}` : ''}` },
      transaction,
    );
    if (act !== 'check')
      await tellOfRelease(state, whole.run, caller.person, done.reason, access.project, deps, transaction);
    return done.release;
  });
  return presentRelease(release);
}

const askForRelease: Handler<'askForRelease'> = (asked) =>
  step('ask', asked, async ({ release: before, whole, transaction }) => {
    const { person } = asked.caller;
    // One asked for anew begins anew; what was withdrawn stays in the audit trail.
    await before?.destroy({ transaction });
    const release = await Release.create(
      {
        projectId: whole.run.projectId,
        runId: whole.run.id,
        state: 'asked',
        preparedBy: person.id,
        preparedName: person.name,
      },
      { transaction },
    );
    return { release, action: 'release.asked', what: 'asked for the release of', reason: null };
  });

const markAsChecked: Handler<'markAsChecked'> = (asked) =>
  step('check', asked, async ({ release, transaction }) => {
    await release!.update(
      { checkedBy: asked.caller.person.id, checkedName: asked.caller.person.name, checkedAt: new Date() },
      { transaction },
    );
    return { release: release!, action: 'release.checked', what: 'checked', reason: null };
  });

const releaseRun: Handler<'releaseRun'> = (asked) =>
  step('release', asked, async ({ release, whole, transaction }) => {
    const reason = asked.body.reason || null;
    const today = new Date().toISOString().slice(0, 10);
    const broken = whole.record.limits.filter((limit) => isBroken(limit, today));
    if (broken.length > 0 && !reason)
      throw badRequest(
        'RELEASE_REASON',
        `expected a written reason, found that ${broken.map((l) => l.name).join(', ')} is outside without a valid waiver`,
        'say why it is released all the same, or write a waiver beside the limit in the file',
      );
    await release!.update(
      {
        state: 'released',
        approvedBy: asked.caller.person.id,
        approvedName: asked.caller.person.name,
        approvedAt: new Date(),
        reason,
      },
      { transaction },
    );
    return { release: release!, action: 'release.made', what: 'released', reason };
  });

const withdrawRelease: Handler<'withdrawRelease'> = (asked) =>
  step('withdraw', asked, async ({ release, transaction }) => {
    const { reason } = asked.body;
    await release!.update(
      {
        state: 'withdrawn',
        withdrawnBy: asked.caller.person.id,
        withdrawnName: asked.caller.person.name,
        withdrawnAt: new Date(),
        withdrawnReason: reason,
      },
      { transaction },
    );
    return { release: release!, action: 'release.withdrawn', what: 'withdrew the release of', reason };
  });

export const releaseRoutes = { askForRelease, markAsChecked, releaseRun, withdrawRelease };
