import type { RollUpRecord } from '#core/record/record.ts';
import { badRequest } from '../../problem.ts';
import { keepInput, missingInputs } from '../../services/inputs.ts';
import { pushRuns as keep } from '../../services/push-runs.ts';
import { type Handler, SENT } from '../route.ts';

const pushRuns: Handler<'pushRuns'> = async ({ caller, access, body, request, response, deps }) => {
  // What is kept is what was sent, keys of later versions included; the checked copy has lost them.
  const sent = (request.body as { runs: { record: RollUpRecord }[] }).runs;
  const runs = body.runs.map(({ key }, i) => ({ key, record: sent[i]!.record }));
  const answers = await keep(runs, caller, access, deps);
  response.status(answers.some((a) => a.status === 'created') ? 201 : 200).json({ runs: answers });
  return SENT;
};

const findMissingInputs: Handler<'findMissingInputs'> = async ({ access, body }) => ({
  missing: await missingInputs(access.project.id, body.sha256),
});

const putInput: Handler<'putInput'> = async ({ access, places, request, deps }) => {
  const hash = places.sha256!;
  if (!/^[0-9a-f]{64}$/.test(hash))
    throw badRequest('INPUT_HASH', 'expected a SHA-256 in small hex letters', 'hash the bytes that are sent');
  const bytes = Buffer.isBuffer(request.body) ? request.body : Buffer.alloc(0);
  await keepInput(access.project.id, hash, bytes, deps);
  return null;
};

export const pushRoutes = { pushRuns, findMissingInputs, putInput };
