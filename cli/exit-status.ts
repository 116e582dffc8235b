/** What the command's exit status says; the same for every command. */
export const EXIT = {
  fine: 0,
  /** A limit is broken (`check`), or a change is over `diff --fail-over`. */
  broken: 1,
  /** The input or the call is wrong. */
  wrong: 2,
  /** Nothing else is wrong, but a record did not reach the server, or the server refused it. */
  unsent: 3,
  /** A bug in Steelyard. */
  bug: 70,
  interrupted: 130,
} as const;

export type ExitStatus = (typeof EXIT)[keyof typeof EXIT];
