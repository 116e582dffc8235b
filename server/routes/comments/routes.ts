import { inTransaction } from '../../database.ts';
import { nameOf } from '../../middleware/caller.ts';
import { Comment } from '../../models/index.ts';
import { notFound } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { findRun, presentComment } from '../../services/run-detail.ts';
import { largeNumber, smallNumber } from '../numbers.ts';
import type { Handler } from '../route.ts';

const addComment: Handler<'addComment'> = async ({ caller, access, places, body }) => {
  const { run } = await findRun(access.project.id, largeNumber(places.run));
  const comment = await Comment.create({
    projectId: access.project.id,
    runId: run.id,
    personId: caller.person.id,
    text: body.text,
  });
  comment.person = caller.person;
  return presentComment(comment, caller);
};

const removeComment: Handler<'removeComment'> = async ({ caller, access, places, address, deps }) => {
  const comment = await Comment.findOne({
    where: {
      id: smallNumber(places.comment),
      runId: largeNumber(places.run),
      projectId: access.project.id,
      personId: caller.person.id,
    },
  });
  if (!comment) throw notFound('a comment of yours');
  await inTransaction(deps.sequelize, async (transaction) => {
    await comment.destroy({ transaction });
    const entry = { who: nameOf(caller), action: 'comment.removed', project: access.project.slug, address };
    await audit({ ...entry, what: `removed their comment on run ${places.run}` }, transaction);
  });
  return null;
};

export const commentRoutes = { addComment, removeComment };
