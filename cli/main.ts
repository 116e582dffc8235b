import { endOnFailedStream, processIo } from './io.ts';
import { version } from './version.ts';

endOnFailedStream();

// The bare version answers before anything else is loaded: scripts ask for it often.
const [only, ...rest] = process.argv.slice(2);
if (rest.length === 0 && (only === '--version' || only === '-V')) {
  process.stdout.write(`${version}\n`);
} else {
  const { run } = await import('./program.ts');
  process.exitCode = await run(process.argv.slice(2), processIo());
}
