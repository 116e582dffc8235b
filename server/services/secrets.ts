import { createHash, randomBytes } from 'node:crypto';

/** A secret for a link or a token: 256 bits, safe in an address. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** How a secret of 256 bits is kept: nothing is gained by a slow hash of what cannot be guessed. */
export const hashSecret = (secret: string): string => createHash('sha256').update(secret).digest('hex');

export const sha256 = (data: string | Uint8Array): string => createHash('sha256').update(data).digest('hex');
