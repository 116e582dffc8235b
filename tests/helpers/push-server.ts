import { createHash } from 'node:crypto';
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { gunzipSync } from 'node:zlib';
import { onTestFinished } from 'vitest';
import { pushSchema } from '../../core/api/push.ts';
import type { RollUpRecord } from '../../core/record/record.ts';

export const TOKEN = 'sy_a-token-of-the-test_0123456789';

export interface Asked {
  readonly method: string;
  /** After `/api/projects/heron`. */
  readonly path: string;
  readonly headers: IncomingMessage['headers'];
  /** Unpacked. */
  readonly body: Buffer;
  readonly at: number;
}

/** Answers instead of the server; `cut` breaks the connection in the middle of the answer. */
export type Answer = { status: number; json?: object; headers?: Record<string, string> } | 'cut' | 'silent';
type Rule = (asked: Asked) => Answer | undefined;

/** A team server as the push meets it, in memory: keeps inputs by hash and runs by key, and can be told to fail. */
export class PushServer {
  readonly asked: Asked[] = [];
  readonly inputs = new Map<string, Buffer>();
  /** By key, in the order in which they came. */
  readonly runs = new Map<string, RollUpRecord>();
  /** How often a key was pushed, acknowledged or not. */
  readonly pushes = new Map<string, number>();
  readonly #server: Server;
  #rules: Rule[] = [];
  url = '';

  constructor() {
    this.#server = createServer((request, response) => this.#receive(request, response));
  }

  static async start(): Promise<PushServer> {
    const one = new PushServer();
    await new Promise<void>((resolve) => one.#server.listen(0, '127.0.0.1', resolve));
    one.url = `http://127.0.0.1:${(one.#server.address() as AddressInfo).port}`;
    onTestFinished(() => one.stop());
    return one;
  }

  stop(): void {
    this.#server.closeAllConnections();
    this.#server.close();
  }

  /** The next requests to a path are answered so, one each; then the server is itself again. */
  next(path: string, ...answers: Answer[]): this {
    const left = [...answers];
    this.#rules.push((asked) => (asked.path === path ? left.shift() : undefined));
    return this;
  }

  /** Every request is answered so. */
  always(rule: Rule): this {
    this.#rules.push(rule);
    return this;
  }

  healed(): this {
    this.#rules = [];
    return this;
  }

  to(path: string): Asked[] {
    return this.asked.filter((asked) => asked.path === path);
  }

  async #receive(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const chunks: Buffer[] = [];
    for await (const chunk of request) chunks.push(chunk as Buffer);
    const raw = Buffer.concat(chunks);
    const asked: Asked = {
      method: request.method ?? '',
      path: (request.url ?? '').replace('/api/projects/heron', ''),
      headers: request.headers,
      body: request.headers['content-encoding'] === 'gzip' ? gunzipSync(raw) : raw,
      at: Date.now(),
    };
    this.asked.push(asked);
    const ruled = this.#rules.map((rule) => rule(asked)).find((answer) => answer !== undefined);
    reply(response, ruled ?? this.#answer(asked));
  }

  #answer(asked: Asked): Answer {
    if (asked.headers.authorization !== `Bearer ${TOKEN}`)
      return problem(401, 'TOKEN_UNKNOWN', `found ${asked.headers.authorization}`);
    if (asked.path === '')
      return {
        status: 200,
        json: { slug: 'heron', name: 'Heron', role: 'engineer', runs: 0, latest: null, watchedBranches: [] },
      };
    if (asked.path === '/inputs/missing') {
      const { sha256 } = JSON.parse(asked.body.toString()) as { sha256: string[] };
      return { status: 200, json: { missing: sha256.filter((hash) => !this.inputs.has(hash)) } };
    }
    const [, hash] = /^\/inputs\/([0-9a-f]{64})$/.exec(asked.path) ?? [];
    if (hash !== undefined) return this.#putInput(hash, asked.body);
    if (asked.path === '/runs') return this.#pushRuns(asked.body);
    return problem(404, 'NOT_FOUND', asked.path);
  }

  #putInput(hash: string, body: Buffer): Answer {
    if (createHash('sha256').update(body).digest('hex') !== hash)
      return problem(422, 'INPUT_HASH', 'the bytes have another hash');
    this.inputs.set(hash, body);
    return { status: 204 };
  }

  #pushRuns(body: Buffer): Answer {
    const { runs } = pushSchema.parse(JSON.parse(body.toString()));
    const answers = runs.map(({ key, record }) => {
      const known = this.runs.has(key);
      this.runs.set(key, record);
      this.pushes.set(key, (this.pushes.get(key) ?? 0) + 1);
      return {
        status: known ? 'known' : 'created',
        id: key,
        address: `/projects/heron/runs/${key}`,
        fault: null,
      };
    });
    return { status: 201, json: { runs: answers } };
  }
}

export const problem = (status: number, code: string, detail: string): Answer => ({
  status,
  json: { type: 'about:blank', title: code, status, code, detail, requestId: 'r1' },
});

function reply(response: ServerResponse, answer: Answer): void {
  if (answer === 'silent') return;
  if (answer === 'cut') {
    response.writeHead(201, { 'content-type': 'application/json', 'content-length': '1000' });
    response.write('{"runs":[');
    setTimeout(() => response.destroy(), 20);
    return;
  }
  const type = answer.status < 400 ? 'application/json' : 'application/problem+json';
  response.writeHead(answer.status, { 'content-type': type, ...answer.headers });
  response.end(answer.json === undefined ? undefined : JSON.stringify(answer.json));
}
