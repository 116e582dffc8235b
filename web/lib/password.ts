import type { PASSWORD_AT_LEAST } from '#core/api/people.ts';

// Typed by the contract, whose module brings zod and stays out of the bundle.
const AT_LEAST: typeof PASSWORD_AT_LEAST = 12;
const BYTES_AT_MOST = 72;

export const PASSWORD_RULE = `At least ${AT_LEAST} characters. Several plain words make a good one.`;

/** What is wrong with a new password as far as its length goes; the server also refuses common ones. */
export function passwordFault(password: string): string | undefined {
  if (password.length < AT_LEAST)
    return password === ''
      ? `Write a password of at least ${AT_LEAST} characters.`
      : `This has ${password.length} characters; ${AT_LEAST} are needed.`;
  if (new TextEncoder().encode(password).length > BYTES_AT_MOST)
    return `This is longer than ${BYTES_AT_MOST} bytes: shorten it.`;
  return undefined;
}
