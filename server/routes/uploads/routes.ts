import { randomUUID } from 'node:crypto';
import { posix } from 'node:path';
import multer from 'multer';
import type { Fault } from '#core/errors.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { TaskFailed } from '../../compute/computer.ts';
import { badRequest, ProblemError } from '../../problem.ts';
import { keepInput } from '../../services/inputs.ts';
import { pushRuns } from '../../services/push-runs.ts';
import { findRunRow } from '../../services/run-rows.ts';
import { sha256 } from '../../services/secrets.ts';
import { version } from '../../version.ts';
import type { AskedInProject, Handler } from '../route.ts';

const read = multer({
  storage: multer.memoryStorage(),
  defParamCharset: 'utf8',
  limits: { fileSize: 64 * 2 ** 20, files: 200, fields: 10, fieldSize: 64 * 1024, parts: 220 },
}).array('files');

const TOTAL_AT_MOST = 256 * 2 ** 20;

interface File {
  readonly path: string;
  readonly content: Buffer;
}

/** Files from a browser: rolled up in a thread; kept, with their runs, only when they are sound. */
const upload: Handler<'upload'> = async (asked) => {
  const { request, response, deps, caller, access } = asked;
  refuseLength(request);
  await new Promise<void>((resolve, reject) => {
    read(request, response, (error) => (error ? reject(error) : resolve()));
  });
  const { files, top, state } = filesOf(request);
  const task = {
    kind: 'upload' as const,
    top,
    state,
    files,
    tool: `steelyard ${version}`,
    at: new Date().toISOString(),
  };
  const result = await deps.computer.rollUp(task).catch((error: unknown) => {
    if (!(error instanceof TaskFailed)) throw error;
    throw new ProblemError(422, 'UPLOAD_TOO_MUCH', `expected less to compute, found that ${error.message}`, {
      hint: 'roll it up with the command and push the record',
    });
  });
  if ('faults' in result)
    return { runs: [], faults: [...result.faults], texts: textsOf(result.faults, files) };
  const answers = await keepRuns(result.records, result.drawings, files, asked);
  const refusals = answers.flatMap(({ fault }) => (fault ? [fault] : []));
  if (refusals.length > 0) return { runs: [], faults: refusals, texts: [] };
  const rows = await Promise.all(answers.map(({ id }) => findRunRow(deps.sequelize, access.project.id, id!)));
  deps.log.info({ project: access.project.slug, person: caller.person.id, runs: rows.length }, 'upload');
  return { runs: rows.map((row) => row!), faults: [], texts: [] };
};

/** Before a byte is read: Node holds a body to the length that it says. */
function refuseLength(request: AskedInProject<'upload'>['request']): void {
  const length = Number(request.get('content-length'));
  if (!(length > 0))
    throw badRequest(
      'UPLOAD_LENGTH',
      'expected a body that says its length, found none',
      'send Content-Length',
    );
  if (length > TOTAL_AT_MOST)
    throw new ProblemError(413, 'UPLOAD_TOO_LARGE', 'expected at most 256 MB in all', {
      hint: 'push them with the command',
    });
}

function filesOf(request: AskedInProject<'upload'>['request']): {
  files: File[];
  top: string;
  state: string | null;
} {
  const sent = (request.files ?? []) as Express.Multer.File[];
  const fields = (request.body ?? {}) as Record<string, unknown>;
  const paths = pathsOf(fields.paths, sent);
  const files = sent.map(({ buffer }, i) => ({ path: paths[i]!, content: buffer }));
  if (files.length === 0)
    throw badRequest(
      'UPLOAD_EMPTY',
      'expected files, found none',
      'choose the assembly file and what it includes',
    );
  if (new Set(paths).size < paths.length)
    throw badRequest('UPLOAD_TWICE', 'expected every path once', 'leave one of them out');
  const top = typeof fields.top === 'string' && fields.top ? nameOfFile(fields.top) : paths[0]!;
  if (!paths.includes(top))
    throw badRequest(
      'UPLOAD_TOP',
      `expected the assembly file among the files, found no ${top}`,
      'name one of them',
    );
  const state = typeof fields.state === 'string' && fields.state ? fields.state : null;
  return { files, top, state };
}

/** Relative paths, in the order of the files; their own names where none are given. */
function pathsOf(given: unknown, sent: readonly Express.Multer.File[]): string[] {
  let paths: unknown = sent.map((f) => f.originalname);
  if (typeof given === 'string' && given) {
    try {
      paths = JSON.parse(given);
    } catch {
      paths = null;
    }
  }
  if (!Array.isArray(paths) || paths.length !== sent.length || !paths.every((p) => typeof p === 'string'))
    throw badRequest(
      'UPLOAD_PATHS',
      'expected `paths` as a JSON array with a path a file',
      'leave it out where all files lie in one folder',
    );
  return paths.map(nameOfFile);
}

/** A path that stays inside the project folder and that every system can hold. */
function nameOfFile(text: string): string {
  const path = posix.normalize(text.replaceAll('\\', '/').replace(/^(\.\/)+/, ''));
  const parts = path.split('/');
  const wrong =
    path.length > 300 ||
    posix.isAbsolute(path) ||
    parts.some((p) => p === '' || p === '.' || p === '..' || p.length > 200) ||
    // biome-ignore lint/suspicious/noControlCharactersInRegex: those are what is refused
    /[\u0000-\u001f\u007f:*?"<>|]/.test(path);
  if (wrong)
    throw badRequest(
      'UPLOAD_NAME',
      `expected a path inside the project folder, found ${JSON.stringify(text.slice(0, 100))}`,
      'rename the file',
    );
  return path;
}

/** The texts of the files that have faults, for the page that shows where. */
function textsOf(faults: readonly Fault[], files: readonly File[]): { path: string; text: string }[] {
  const named = new Set(faults.map((fault) => fault.at?.file));
  return files
    .filter((f) => named.has(f.path) && f.content.length < 2 ** 20)
    .map((f) => ({
      path: f.path,
      text: f.content
        .toString('utf8')
        .replace(/^\ufeff/, '')
        .replace(/\r\n?/g, '\n'),
    }));
}

async function keepRuns(
  records: readonly RollUpRecord[],
  drawings: readonly string[],
  files: readonly File[],
  { caller, access, deps }: AskedInProject<'upload'>,
) {
  // Texts are kept as they are hashed, with LF; meshes as their bytes.
  const byPath = new Map(files.map((f) => [f.path, f.content]));
  const inputs = new Map(records.flatMap((r) => r.inputs.map((input) => [input.sha256, input] as const)));
  for (const { path, sha256: hash, text } of inputs.values()) {
    const bytes = text === undefined ? byPath.get(path)! : Buffer.from(text);
    if (sha256(bytes) === hash) await keepInput(access.project.id, hash, bytes, deps);
  }
  const key = randomUUID();
  const runs = records.map((record, i) => ({ record, key, drawing: drawings[i]! }));
  return pushRuns(runs, caller, access, deps);
}

export const uploadRoutes = { upload };
