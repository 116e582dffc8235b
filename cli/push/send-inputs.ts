import type { Client } from './client.ts';
import type { Outgoing } from './outgoing.ts';
import { Trouble } from './trouble.ts';

/** Hashes in one question, well under what the contract allows: the server takes small bodies here. */
const QUESTION_AT_MOST = 2000;

interface Wanted {
  readonly path: string;
  readonly isText: boolean;
  readonly item: Outgoing;
}

/**
 * Sends the inputs of some records that the server does not have, each once.
 *
 * @param there hashes that the server is known to have; added to
 * @returns paths of inputs that the server lacks and that could not be given
 */
export async function sendInputs(
  items: readonly Outgoing[],
  client: Client,
  there: Set<string>,
  tell: (text: string) => void,
): Promise<string[]> {
  const wanted = new Map<string, Wanted>();
  for (const item of items)
    for (const { sha256, path, isText, found } of item.about.inputs)
      if (!there.has(sha256) && (found || !wanted.has(sha256))) wanted.set(sha256, { path, isText, item });
  const hashes = [...wanted.keys()];
  const without: string[] = [];
  for (let at = 0; at < hashes.length; at += QUESTION_AT_MOST) {
    const asked = hashes.slice(at, at + QUESTION_AT_MOST);
    const missing = new Set(await client.findMissing(asked));
    for (const sha256 of asked) {
      const { path, isText, item } = wanted.get(sha256)!;
      if (missing.has(sha256)) {
        const bytes = item.input(sha256);
        if (bytes && bytes.length > 2 ** 20)
          tell(`sending ${path}, ${(bytes.length / 2 ** 20).toFixed(1)} MiB`);
        if (!bytes || !(await put(client, sha256, bytes, isText))) {
          without.push(path);
          continue;
        }
      }
      there.add(sha256);
    }
  }
  return without;
}

/** Whether the server took it; an input that it refuses does not hold the record back. */
async function put(client: Client, sha256: string, bytes: Uint8Array, isText: boolean): Promise<boolean> {
  try {
    await client.putInput(sha256, bytes, isText);
    return true;
  } catch (error) {
    if (error instanceof Trouble && error.ofThisBody) return false;
    throw error;
  }
}
