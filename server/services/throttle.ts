import { createHash } from 'node:crypto';
import { ipKeyGenerator } from 'express-rate-limit';
import { Op } from 'sequelize';
import { SignInFailure } from '../models/index.ts';
import { ProblemError } from '../problem.ts';

const WINDOW_SECONDS = 15 * 60;
const PAIR_AT_MOST = 5;
const ADDRESS_AT_MOST = 100;

/** Accounts are kept as hashes: what people type there by mistake is now and then a password. */
const keyOf = (email: string): string => createHash('sha256').update(email.toLowerCase()).digest('hex');

/** IPv6 hands out whole networks: one /64 is one address here. */
const networkOf = (address: string): string => (address ? ipKeyGenerator(address, 64) : '');

/**
 * Notes an attempt before the password is looked at, so that many at once are counted too, and refuses it after 5 wrong
 * passwords for this account from this address in 15 minutes, or 100 from this address for any: whoever guesses is
 * slowed, whoever knows the password still gets in from elsewhere, and an office behind one address is not locked out
 * by one colleague. A right password takes its notes back (`forgiveAccount`).
 *
 * @throws ProblemError 429
 */
export async function noteAttempt(email: string, from: string): Promise<void> {
  const address = networkOf(from);
  const note = await SignInFailure.create({ account: keyOf(email), address });
  const since = new Date(Date.now() - WINDOW_SECONDS * 1000);
  const where = { address, at: { [Op.gt]: since } };
  const latest = { order: [['at', 'DESC']] as [string, string][] };
  const [pair, all] = await Promise.all([
    SignInFailure.findAll({ where: { ...where, account: keyOf(email) }, ...latest, limit: PAIR_AT_MOST + 1 }),
    SignInFailure.findAll({ where, ...latest, limit: ADDRESS_AT_MOST + 1 }),
  ]);
  const oldest =
    pair.length > PAIR_AT_MOST ? pair.at(-1) : all.length > ADDRESS_AT_MOST ? all.at(-1) : undefined;
  if (!oldest) return;
  // What is refused unseen is no wrong password.
  await note.destroy();
  const passed = Math.floor((Date.now() - oldest.at.getTime()) / 1000);
  const retryAfter = Math.max(1, WINDOW_SECONDS - passed);
  throw new ProblemError(429, 'SIGN_IN_SLOWED', 'expected fewer wrong passwords from this address', {
    hint: `wait ${Math.ceil(retryAfter / 60)} minutes, or set a new password by the link on this page`,
    retryAfter,
  });
}

/** A right password ends the slowing of its own account from that address. Old notes are of no use to anybody. */
export async function forgiveAccount(email: string, from: string): Promise<void> {
  await SignInFailure.destroy({ where: { account: keyOf(email), address: networkOf(from) } });
  await SignInFailure.destroy({
    where: { at: { [Op.lt]: new Date(Date.now() - 4 * WINDOW_SECONDS * 1000) } },
  });
}
