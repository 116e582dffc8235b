import { version } from './version.ts';

// The bare version answers before anything else is loaded: scripts ask for it often.
const [only, ...rest] = process.argv.slice(2);
if (rest.length === 0 && (only === '--version' || only === '-V')) {
  process.stdout.write(`${version}\n`);
} else {
  const { start } = await import('./program.ts');
  process.exitCode = await start(process.argv.slice(2));
}
