// npm start: builds what is missing or stale, then starts the server with its demo.
import { buildIfStale } from './build.js';

await buildIfStale((line) => process.stderr.write(`steelyard: ${line}\n`));
await import('../dist/server/start-local.js');
