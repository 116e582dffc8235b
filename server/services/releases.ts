import type { Release as ReleaseAnswer } from '#core/api/runs.ts';
import { type Access, type Caller, hasRole } from '../middleware/caller.ts';
import type { Person, Release } from '../models/index.ts';
import type { WholeRun } from './run-detail.ts';

/** Why someone may not do something with a release, in a sentence; null where they may. */
export interface Against {
  readonly ask: string | null;
  readonly check: string | null;
  readonly release: string | null;
  readonly withdraw: string | null;
}

/**
 * The rules of release: never one's own push nor a commit that one wrote; not from a dirty tree, nor what the server's
 * own computation contradicts or cannot redo. Whether a broken limit needs a reason is judged where it is given.
 */
export function reasonsAgainst(
  whole: WholeRun,
  release: Release | null,
  caller: Caller,
  { role }: Access,
): Against {
  const signed = caller.token === null;
  const unfit = unfitness(whole);
  const own = ownership(whole, caller);
  const state = release?.state ?? null;
  const needs = (least: 'engineer' | 'approver') =>
    !hasRole(role, least)
      ? `This takes the role of an ${least}.`
      : signed
        ? null
        : 'This is done in the browser, signed in.';
  return {
    ask: needs('engineer') ?? unfit ?? (state === null || state === 'withdrawn' ? null : said[state]),
    check:
      needs('engineer') ??
      unfit ??
      own ??
      (state === 'asked' ? checkedAlready(release!, caller) : notAsked(state)),
    release: needs('approver') ?? unfit ?? own ?? (state === 'asked' ? null : notAsked(state)),
    withdraw:
      needs('approver') ??
      (state === 'released' || state === 'asked' ? null : 'It is not released, nor was it asked for.'),
  };
}

const said = {
  asked: 'Its release was asked for already.',
  released: 'It is released.',
  withdrawn: 'Its release was withdrawn; it can be asked for anew.',
} as const;

const notAsked = (state: keyof typeof said | null): string =>
  state === null ? 'Nobody has asked for its release yet.' : said[state];

const checkedAlready = (release: Release, { person }: Caller): string | null =>
  release.checkedBy !== null
    ? 'It is checked already.'
    : release.preparedBy === person.id
      ? 'Who prepared it does not check it.'
      : null;

function unfitness({ run, stored }: WholeRun): string | null {
  if (run.dirty) return 'It came from a working tree with changes that were not committed.';
  if (stored.recomputation === 'waiting') return 'The server has not computed it again yet.';
  if (stored.recomputation === 'recomputed') return null;
  return stored.recomputation === 'differs'
    ? 'The server computes other figures from the same inputs.'
    : 'The server cannot compute it again.';
}

function ownership({ run, byMachine }: WholeRun, { person }: Caller): string | null {
  // What a machine pushed without saying whose commit it is counts as pushed by who gave it the token.
  if (run.personId === person.id && (!byMachine || run.author === null)) return 'You pushed it yourself.';
  return run.author !== null && isSame(run.author, person) ? 'You wrote its commit yourself.' : null;
}

/** A commit's author is `Name <mail>`, a name or an address. */
function isSame(author: string, { name, email }: Person): boolean {
  const mail = /<([^>]+)>/.exec(author)?.[1] ?? author;
  const called = author.replace(/<[^>]*>/, '').trim();
  return mail.toLowerCase() === email || called.toLowerCase() === name.toLowerCase();
}

export function presentRelease(release: Release): ReleaseAnswer {
  const day = (date: Date | null) => date?.toISOString() ?? null;
  return {
    state: release.state,
    preparedBy: release.preparedName,
    preparedAt: release.preparedAt.toISOString(),
    checkedBy: release.checkedName,
    checkedAt: day(release.checkedAt),
    approvedBy: release.approvedName,
    approvedAt: day(release.approvedAt),
    reason: release.reason,
    withdrawnBy: release.withdrawnName,
    withdrawnAt: day(release.withdrawnAt),
    withdrawnReason: release.withdrawnReason,
  };
}
