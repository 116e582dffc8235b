// Builds the command once before any test, so that tests of the process run what the source says.
import { build } from '../../cli/build.js';

export default async function setup(): Promise<void> {
  await build();
}
