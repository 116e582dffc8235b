import { createHash } from 'node:crypto';
import { Op } from 'sequelize';
import { SignInFailure } from '../models/index.ts';
import { ProblemError } from '../problem.ts';

const WINDOW_SECONDS = 15 * 60;
const PAIR_AT_MOST = 5;
const ADDRESS_AT_MOST = 100;

/** Accounts are kept as hashes: what people type there by mistake is now and then a password. */
const keyOf = (email: string): string => createHash('sha256').update(email.toLowerCase()).digest('hex');

/**
 * Refuses a sign-in after 5 wrong passwords for this account from this address in 15 minutes, or 100 from this address
 * for any: whoever guesses is slowed, whoever knows the password still gets in from elsewhere, and an office behind one
 * address is not locked out by one colleague.
 *
 * @throws ProblemError 429
 */
export async function refuseGuessing(email: string, address: string): Promise<void> {
  const since = new Date(Date.now() - WINDOW_SECONDS * 1000);
  const where = { address, at: { [Op.gt]: since } };
  const [pair, all] = await Promise.all([
    SignInFailure.findAll({
      where: { ...where, account: keyOf(email) },
      order: [['at', 'DESC']],
      limit: PAIR_AT_MOST,
    }),
    SignInFailure.findAll({ where, order: [['at', 'DESC']], limit: ADDRESS_AT_MOST }),
  ]);
  const oldest =
    pair.length >= PAIR_AT_MOST ? pair.at(-1) : all.length >= ADDRESS_AT_MOST ? all.at(-1) : undefined;
  if (!oldest) return;
  const retryAfter = Math.max(1, WINDOW_SECONDS - Math.floor((Date.now() - oldest.at.getTime()) / 1000));
  throw new ProblemError(429, 'SIGN_IN_SLOWED', 'expected fewer wrong passwords from this address', {
    hint: `wait ${Math.ceil(retryAfter / 60)} minutes, or set a new password by the link on this page`,
    retryAfter,
  });
}

export async function noteWrongPassword(email: string, address: string): Promise<void> {
  await SignInFailure.create({ account: keyOf(email), address });
  // Old ones are of no use to anybody.
  await SignInFailure.destroy({
    where: { at: { [Op.lt]: new Date(Date.now() - 4 * WINDOW_SECONDS * 1000) } },
  });
}

/** A right password ends the slowing of its own account from that address. */
export async function forgiveAccount(email: string, address: string): Promise<void> {
  await SignInFailure.destroy({ where: { account: keyOf(email), address } });
}
