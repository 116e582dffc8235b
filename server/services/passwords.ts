import bcrypt from 'bcryptjs';
import { ProblemError } from '../problem.ts';
import { COMMON_PASSWORDS } from './common-passwords.ts';

/** Compared with where there is no account, so that the answer takes as long as for one that is there. */
let nobody: Promise<string> | null = null;

export const hashPassword = (password: string, cost: number): Promise<string> => bcrypt.hash(password, cost);

/** Whether a password is the account's; without an account it takes as long and is false. */
export async function isPassword(password: string, hash: string | null, cost: number): Promise<boolean> {
  nobody ??= bcrypt.hash('nobody at all', cost);
  const right = await bcrypt.compare(password, hash ?? (await nobody));
  return right && hash !== null;
}

/**
 * Refuses what is easily guessed; length is judged by the request's schema.
 *
 * @throws ProblemError 400 PASSWORD_COMMON, PASSWORD_TOO_LONG
 */
export function checkPassword(password: string, email: string, name: string): void {
  if (bcrypt.truncates(password))
    throw new ProblemError(400, 'PASSWORD_TOO_LONG', 'expected a password of at most 72 bytes', {
      hint: 'letters outside ASCII take two bytes or more',
    });
  const plain = password.toLowerCase();
  const own = [email.split('@')[0]!, ...name.split(/\s+/)]
    .map((w) => w.toLowerCase())
    .filter((w) => w.length > 3);
  const rest = own.reduce((left, word) => left.replaceAll(word, ''), plain);
  const repeats = new Set(plain).size < 5;
  const core = plain.replace(/[^a-z]+/g, '');
  if (COMMON_PASSWORDS.has(plain) || COMMON_PASSWORDS.has(core) || repeats || rest.length < 6)
    throw new ProblemError(
      400,
      'PASSWORD_COMMON',
      'expected a password that is not easily guessed, found a common one or one made of your name',
      {
        hint: 'several words that do not belong together are good',
      },
    );
}
