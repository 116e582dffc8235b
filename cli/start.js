// npm start: builds the command when it is not there, rolls up the demo assembly, judges its limits and says what to do next.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from './build.js';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const command = join(root, 'dist', 'cli', 'steelyard.js');
const demo = 'examples/survey-drone/drone.yaml';

if (!existsSync(command)) await build();
const { status } = spawnSync(process.execPath, [command, 'check', demo, '--format', 'table'], {
  cwd: root,
  stdio: 'inherit',
});
if (status !== 0 && status !== 1) process.exit(status ?? 70);
console.log(`
That was ${demo}: every state, its limits judged. Next:
  npx steelyard run ${demo} --state stowed --parts all
  npx steelyard run ${demo} --of airframe
  npx steelyard new machine.yaml && npx steelyard run machine.yaml
  npx steelyard --help
README.md explains the format; examples/README.md the other assemblies.`);
