// Builds the command and the server once before any test, so that tests of processes and threads run what the source says.
import { build } from '../../cli/build.js';
import { buildServer } from '../../server/build.js';

export default async function setup(): Promise<void> {
  await build();
  await buildServer();
}
