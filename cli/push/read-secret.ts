import { EXIT } from '../exit-status.ts';
import type { Io } from '../io.ts';

/** The longest line that is read. */
const CHARACTERS_AT_MOST = 5000;

/** One line of standard input, trimmed: asked for without echo at a terminal, read as it comes from a pipe. */
export function readSecret(io: Io, prompt: string): Promise<string> {
  return process.stdin.isTTY ? askHidden(io, prompt) : readLine();
}

async function readLine(): Promise<string> {
  let text = '';
  process.stdin.setEncoding('utf8');
  for await (const chunk of process.stdin) {
    text += chunk;
    if (text.includes('\n') || text.length > CHARACTERS_AT_MOST) break;
  }
  return text.split('\n')[0]!.trim();
}

function askHidden(io: Io, prompt: string): Promise<string> {
  const { stdin } = process;
  io.err(prompt);
  stdin.setRawMode(true);
  stdin.setEncoding('utf8');
  return new Promise((resolve) => {
    let text = '';
    const leave = () => {
      stdin.setRawMode(false);
      stdin.pause();
      stdin.removeListener('data', take);
      io.err('\n');
    };
    const take = (chunk: string) => {
      for (const key of chunk) {
        if (key === '\u0003') {
          leave();
          process.exit(EXIT.interrupted);
        }
        if (key === '\r' || key === '\n' || key === '\u0004') {
          leave();
          resolve(text.trim());
          return;
        }
        if (key === '\u007f' || key === '\b') text = text.slice(0, -1);
        else if (text.length < CHARACTERS_AT_MOST) text += key;
      }
    };
    stdin.on('data', take);
    stdin.once('end', () => {
      leave();
      resolve(text.trim());
    });
  });
}
