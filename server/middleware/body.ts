import express, { type RequestHandler } from 'express';
import { INPUT_BYTES_AT_MOST, PUSH_BYTES_AT_MOST } from '#core/api/push.ts';
import type { RouteName } from '#core/api/routes.ts';
import { badRequest } from '../problem.ts';

const DEPTH_AT_MOST = 40;
const QUOTE = 0x22;
const BACKSLASH = 0x5c;

/** Refuses JSON nested deeper than any request of this API, before it is parsed. */
function refuseDepth(_: unknown, __: unknown, bytes: Buffer): void {
  let depth = 0;
  let inText = false;
  for (let i = 0; i < bytes.length; i++) {
    const byte = bytes[i]!;
    if (inText) {
      if (byte === BACKSLASH) i++;
      else if (byte === QUOTE) inText = false;
    } else if (byte === QUOTE) inText = true;
    else if (byte === 0x5b || byte === 0x7b) {
      if (++depth > DEPTH_AT_MOST)
        throw badRequest(
          'BODY_TOO_DEEP',
          `expected JSON of at most ${DEPTH_AT_MOST} levels`,
          'send what the API document describes',
        );
    } else if (byte === 0x5d || byte === 0x7d) depth--;
  }
}

const json = express.json({ limit: '512kb', verify: refuseDepth });
const pushJson = express.json({ limit: PUSH_BYTES_AT_MOST, verify: refuseDepth });
const raw = express.raw({ type: () => true, limit: INPUT_BYTES_AT_MOST });

/** How the body of a route is read, its limits included; gzip is unpacked within the same limits. */
export const bodyReader = (name: RouteName): RequestHandler | null => {
  if (name === 'pushRuns') return pushJson;
  if (name === 'putInput') return raw;
  return name === 'upload' ? null : json;
};
