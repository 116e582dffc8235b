/** The longest that one push spends on failed attempts and on the waits between them [ms]. */
const SPENT_AT_MOST = 60_000;
/** The longest single wait by itself, and the longest that the server may ask for [ms]. */
const WAIT_AT_MOST = 8000;
const ASKED_AT_MOST = 30_000;

/**
 * How long a push goes on trying: exponential backoff with full jitter, a bounded number of retries for each request
 * and a bounded time of waiting in all.
 *
 * Two variables are for tests and for lines that are slow out of the ordinary: STEELYARD_PUSH_WAIT_MS, the first wait
 * at most (500), and STEELYARD_PUSH_TIMEOUT_MS, how long the server may take to answer (30 000).
 */
export class Patience {
  readonly retries: number;
  readonly timeout: number;
  readonly #firstWait: number;
  #left = SPENT_AT_MOST;

  constructor(retries: number, env: NodeJS.ProcessEnv) {
    this.retries = retries;
    this.#firstWait = positive(env.STEELYARD_PUSH_WAIT_MS, 500);
    this.timeout = positive(env.STEELYARD_PUSH_TIMEOUT_MS, 30_000);
  }

  /**
   * The wait before another attempt [ms]; null where it is time to give up.
   *
   * @param attempt how many have failed, from 1
   * @param asked what the server's Retry-After asks for [ms]
   * @param spent how long the failed attempt took [ms]; a silent server uses patience up as well
   */
  next(attempt: number, asked: number | null, spent: number): number | null {
    this.#left -= spent;
    if (attempt > this.retries || (asked ?? 0) > ASKED_AT_MOST) return null;
    const jittered = Math.random() * Math.min(WAIT_AT_MOST, this.#firstWait * 2 ** (attempt - 1));
    const wait = (asked ?? 0) + jittered;
    if (wait > this.#left) return null;
    this.#left -= wait;
    return wait;
  }

  /** The longest that an exchange with a body of some bytes may take [ms]: a slow line of 100 kB/s is let finish. */
  timeoutOf(bytes: number): number {
    return this.timeout + Math.ceil(bytes / 100);
  }
}

const positive = (text: string | undefined, usual: number): number => {
  const number = Number(text);
  return text && number > 0 ? number : usual;
};

/** Retry-After as milliseconds from now: seconds, or a date of HTTP. */
export function retryAfter(value: string | null, now = Date.now()): number | null {
  if (value === null) return null;
  if (/^\s*\d+\s*$/.test(value)) return Number(value) * 1000;
  const date = Date.parse(value);
  return Number.isNaN(date) ? null : Math.max(0, date - now);
}
