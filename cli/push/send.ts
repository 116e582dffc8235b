import { BATCH_AT_MOST, PUSH_BYTES_AT_MOST } from '#core/api/push.ts';
import type { Fault } from '#core/errors.ts';
import type { Client } from './client.ts';
import type { About, Outgoing } from './outgoing.ts';
import { sendInputs } from './send-inputs.ts';
import { Trouble } from './trouble.ts';

/** A batch is closed when it has come to this, so that no request is long [bytes of JSON]. */
const BATCH_BYTES = 8 * 2 ** 20;
/** What a request has around its records. */
const ENVELOPE = 4096;

export interface Sent {
  readonly about: About;
  readonly status: 'created' | 'known';
  /** Of its page, as the server says it. */
  readonly address: string | null;
}

/** What became of the records of one push. */
export interface Outcome {
  readonly sent: Sent[];
  readonly refused: { about: About; why: Fault; kept: boolean }[];
  /** Not sent this time, and why. */
  readonly waiting: Outgoing[];
  trouble: Fault | null;
  /** Left to another process that is sending them. */
  elsewhere: number;
  /** Inputs by path that a record went without. */
  readonly without: Set<string>;
}

interface Loaded {
  readonly item: Outgoing;
  readonly json: string;
}

/**
 * Sends records in batches, each after the inputs that the server does not have. The first trouble that is not of one
 * record ends it: what is left waits.
 *
 * @param tell is told of progress, a line at a time
 */
export async function send(
  items: readonly Outgoing[],
  client: Client,
  tell: (text: string) => void,
): Promise<Outcome> {
  const outcome: Outcome = {
    sent: [],
    refused: [],
    waiting: [],
    trouble: null,
    elsewhere: 0,
    without: new Set(),
  };
  const there = new Set<string>();
  const flush = async (batch: readonly Loaded[]) => {
    if (batch.length === 0) return;
    await sendBatch(batch, client, outcome, there, tell);
    if (items.length > batch.length) tell(`${outcome.sent.length} of ${items.length} sent`);
  };
  let next = 0;
  let batch: Loaded[] = [];
  try {
    for (let size = 0; next < items.length; next++) {
      const loaded = load(items[next]!, outcome);
      if (!loaded) continue;
      if (batch.length === BATCH_AT_MOST || (batch.length > 0 && size + loaded.json.length > BATCH_BYTES)) {
        await flush(batch);
        batch = [];
        size = 0;
      }
      batch.push(loaded);
      size += loaded.json.length;
    }
    await flush(batch);
  } catch (error) {
    if (!(error instanceof Trouble)) throw error;
    outcome.trouble = error.fault;
    const settled = new Set([...outcome.sent, ...outcome.refused].map(({ about }) => about.key));
    const left = [...batch.map(({ item }) => item), ...items.slice(next)];
    for (const item of new Set(left))
      if (!settled.has(item.about.key)) {
        item.postpone(error.fault);
        outcome.waiting.push(item);
      }
  }
  return outcome;
}

/** The record itself; null where it is not for this process to send, or never can be sent. */
function load(item: Outgoing, outcome: Outcome): Loaded | null {
  if (!item.claim()) {
    outcome.elsewhere++;
    return null;
  }
  const json = item.json();
  if (json === null) {
    outcome.elsewhere++;
    return null;
  }
  const bytes = Buffer.byteLength(json);
  if (bytes + ENVELOPE <= PUSH_BYTES_AT_MOST) return { item, json };
  refuse(item, outcome, {
    code: 'PUSH_TOO_LARGE',
    message: `expected a record of at most ${PUSH_BYTES_AT_MOST / 2 ** 20} MiB without its inputs, found ${(bytes / 2 ** 20).toFixed(1)} MiB`,
    hint: 'split the assembly into several',
  });
  return null;
}

async function sendBatch(
  batch: readonly Loaded[],
  client: Client,
  outcome: Outcome,
  there: Set<string>,
  tell: (text: string) => void,
): Promise<void> {
  const items = batch.map(({ item }) => item);
  for (const path of await sendInputs(items, client, there, tell)) outcome.without.add(path);
  const runs = batch.map(({ item, json }) => `{"key":${JSON.stringify(item.about.key)},"record":${json}}`);
  const answers = await client.pushRuns(`{"runs":[${runs.join(',')}]}`, batch.length).catch((error) => {
    if (error instanceof Trouble && error.ofThisBody) return error;
    throw error;
  });
  if (answers instanceof Trouble) {
    // The server does not say which: one by one it will.
    if (batch.length > 1) for (const one of batch) await sendBatch([one], client, outcome, there, tell);
    else refuse(items[0]!, outcome, answers.fault);
    return;
  }
  answers.forEach(({ status, address, fault }, i) => {
    const item = items[i]!;
    if (status === 'refused') {
      refuse(item, outcome, fault ?? { code: 'PUSH_REFUSED', message: 'the server gave no reason' });
      return;
    }
    item.done();
    outcome.sent.push({ about: item.about, status, address });
  });
}

function refuse(item: Outgoing, outcome: Outcome, why: Fault): void {
  item.refuse(why);
  outcome.refused.push({ about: item.about, why, kept: item.kept });
}
