import { promisify } from 'node:util';
import { gunzip, gzip } from 'node:zlib';
import { QueryTypes } from 'sequelize';
import { INPUT_BYTES_AT_MOST } from '#core/api/push.ts';
import { decodeText } from '#core/yaml/index.ts';
import type { Deps } from '../deps.ts';
import { Input } from '../models/index.ts';
import { badRequest } from '../problem.ts';
import { sha256 } from './secrets.ts';

const pack = promisify<Uint8Array, { level: number }, Buffer>(gzip);
const unpack = promisify<Uint8Array, { maxOutputLength: number }, Buffer>(gunzip);

/** Which of some hashes a project has no input for. */
export async function missingInputs(projectId: number, hashes: readonly string[]): Promise<string[]> {
  const found = await Input.findAll({
    where: { projectId, sha256: [...new Set(hashes)] },
    attributes: ['sha256'],
    raw: true,
  });
  const known = new Set(found.map((input) => input.sha256));
  return [...new Set(hashes)].filter((hash) => !known.has(hash));
}

/**
 * Keeps an input under its hash, once.
 *
 * @throws ProblemError 400 INPUT_HASH where the bytes are others than the hash says
 */
export async function keepInput(
  projectId: number,
  hash: string,
  bytes: Uint8Array,
  { sequelize }: Pick<Deps, 'sequelize'>,
  transaction?: import('sequelize').Transaction,
): Promise<void> {
  const found = sha256(bytes);
  if (found !== hash)
    throw badRequest(
      'INPUT_HASH',
      `expected bytes with the SHA-256 ${hash.slice(0, 12)}, found ${found.slice(0, 12)}`,
      'send the file again, as it was when the record was made; texts as UTF-8 with LF',
    );
  await sequelize.query(
    `INSERT INTO inputs (project_id, sha256, size, content) VALUES ($1, $2, $3, $4)
     ON CONFLICT (project_id, sha256) DO NOTHING`,
    {
      bind: [projectId, hash, bytes.length, await pack(bytes, { level: 4 })],
      type: QueryTypes.INSERT,
      transaction: transaction ?? null,
    },
  );
}

const TEXT_AT_MOST = 4 * 2 ** 20;

/** The text of an input; null where it is a mesh, no text, or too long to be shown. */
export async function textOf(input: Input): Promise<string | null> {
  if (Number(input.size) > TEXT_AT_MOST) return null;
  const bytes = await unpack(input.content, { maxOutputLength: INPUT_BYTES_AT_MOST });
  if (bytes.includes(0)) return null;
  try {
    return decodeText(bytes, '');
  } catch {
    return null;
  }
}
