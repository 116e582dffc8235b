import { setTimeout as wait } from 'node:timers/promises';
import { promisify } from 'node:util';
import { gzip } from 'node:zlib';
import type * as z from 'zod';
import { type Problem, problemSchema } from '#core/api/problem.ts';
import { type Project, projectSchema } from '#core/api/projects.ts';
import { missingInputsAnswerSchema, type Pushed, pushedSchema } from '#core/api/push.ts';
import { addressOf, ROUTES, type RouteName } from '#core/api/routes.ts';
import { version } from '../version.ts';
import { type Patience, retryAfter } from './patience.ts';
import type { Settings } from './settings.ts';
import {
  type BadAnswer,
  connectionCode,
  isOfCertificate,
  isWorthRetrying,
  Trouble,
  troubleOfAnswer,
  troubleOfConnection,
} from './trouble.ts';

const compress = promisify(gzip);

interface Body {
  readonly type: 'application/json' | 'application/octet-stream';
  readonly bytes: Uint8Array | string;
  readonly packed: boolean;
}

/** The server as the command meets it. Every method tries again as `Patience` allows, then throws Trouble. */
export class Client {
  readonly settings: Settings;
  readonly #patience: Patience;

  constructor(settings: Settings, patience: Patience) {
    this.settings = settings;
    this.#patience = patience;
  }

  async showProject(): Promise<Project> {
    return this.#read(projectSchema, await this.#ask('showProject'));
  }

  /** Those of these inputs, by SHA-256, that the server does not have. */
  async findMissing(sha256: readonly string[]): Promise<string[]> {
    const bytes = JSON.stringify({ sha256 });
    const text = await this.#ask('findMissingInputs', {}, { type: 'application/json', bytes, packed: true });
    return this.#read(missingInputsAnswerSchema, text).missing;
  }

  async putInput(sha256: string, bytes: Uint8Array, isText: boolean): Promise<void> {
    await this.#ask('putInput', { sha256 }, { type: 'application/octet-stream', bytes, packed: isText });
  }

  /** @param json of `pushSchema` */
  async pushRuns(json: string, count: number): Promise<Pushed['runs']> {
    const text = await this.#ask('pushRuns', {}, { type: 'application/json', bytes: json, packed: true });
    const { runs } = this.#read(pushedSchema, text);
    if (runs.length !== count) throw this.#strange(`${runs.length} answers to ${count} records`);
    return runs;
  }

  async #ask(name: RouteName, places: Record<string, string> = {}, body?: Body): Promise<string> {
    const { server, project } = this.settings;
    const url = server + addressOf(name, { project, ...places });
    const sent = body && { ...body, bytes: body.packed ? await compress(body.bytes) : body.bytes };
    for (let attempt = 1; ; attempt++) {
      const began = performance.now();
      const answer = await this.#try(name, url, sent).catch((error: unknown) => {
        if (isOfCertificate(connectionCode(error))) throw troubleOfConnection(error, server, attempt);
        return { error };
      });
      if (typeof answer === 'string') return answer;
      const asked = 'error' in answer ? null : answer.retryAfter;
      const again =
        'error' in answer || isWorthRetrying(answer.status)
          ? this.#patience.next(attempt, asked, performance.now() - began)
          : null;
      if (again === null)
        throw 'error' in answer
          ? troubleOfConnection(answer.error, server, attempt)
          : troubleOfAnswer(answer, this.settings, attempt);
      await wait(again);
    }
  }

  /** One attempt: the body of a success, or what else came. A broken connection throws. */
  async #try(name: RouteName, url: string, body: Body | undefined): Promise<string | BadAnswer> {
    const response = await fetch(url, {
      method: ROUTES[name].method,
      headers: {
        accept: 'application/json',
        authorization: `Bearer ${this.settings.token}`,
        'user-agent': `steelyard/${version}`,
        ...(body && { 'content-type': body.type, ...(body.packed && { 'content-encoding': 'gzip' }) }),
      },
      ...(body && { body: body.bytes as Uint8Array<ArrayBuffer> | string }),
      // A POST that is led elsewhere would arrive as a GET, and the token at a place that nobody named.
      redirect: 'manual',
      signal: AbortSignal.timeout(this.#patience.timeoutOf(body?.bytes.length ?? 0)),
    });
    // Nothing that the server says may carry the token to the screen.
    const text = (await response.text()).replaceAll(this.settings.token, '…');
    if (response.ok) return text;
    return {
      status: response.status,
      problem: problemOf(text),
      location: response.headers.get('location'),
      retryAfter: retryAfter(response.headers.get('retry-after')),
    };
  }

  #read<T>(schema: z.ZodType<T>, text: string): T {
    try {
      return schema.parse(JSON.parse(text));
    } catch {
      throw this.#strange('something else');
    }
  }

  #strange(found: string): Trouble {
    return new Trouble({
      code: 'PUSH_ANSWER',
      message: `expected an answer of a Steelyard server from ${this.settings.server}, found ${found}`,
      hint: 'check the address; a proxy on the way may have answered, or the server is of another version',
    });
  }
}

function problemOf(text: string): Problem | null {
  try {
    const result = problemSchema.safeParse(JSON.parse(text));
    return result.success ? result.data : null;
  } catch {
    return null;
  }
}
