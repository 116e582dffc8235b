import type { Fault } from '#core/errors.ts';
import { plainText } from '#core/figures/index.ts';
import type { Context } from '../commands/context.ts';
import { EXIT } from '../exit-status.ts';
import { nameOf, shortId } from './outgoing.ts';
import type { Outcome, Sent } from './send.ts';
import type { Settings } from './settings.ts';
import type { Tray } from './tray.ts';

/** Lines about records that arrived; more are counted. */
const LINES_AT_MOST = 10;
const INPUT_MISSING = 'PUSH_INPUT_MISSING';

/** Says on stderr what became of the records, and sets the exit status where nothing worse has set it. */
export async function report(
  outcome: Outcome,
  settings: Settings,
  tray: Tray,
  context: Context,
): Promise<void> {
  const { reportFaults } = await import('../program.ts');
  const say = (text: string) => context.io.err(`${plainText(text)}\n`);
  if (!context.quiet) {
    for (const line of linesOfSent(outcome.sent, settings)) say(line);
    for (const path of outcome.without)
      say(
        `warning ${INPUT_MISSING}: ${path} is not on the server; it was not found as it was rolled up, or is larger than the server takes. That run cannot be recomputed there`,
      );
    if (outcome.elsewhere > 0) say(`${count(outcome.elsewhere)} left to another process that sends them`);
  }
  const faults = outcome.refused.map(({ about, why }): Fault => refusal(nameOf(about), settings, why));
  if (outcome.trouble) faults.push(outcome.trouble);
  if (faults.length === 0) return;
  reportFaults(faults, context);
  const apart = outcome.refused.filter(({ kept }) => kept);
  if (apart.length > 0)
    say(
      `${count(apart.length)} set apart in the tray (${tray.root}); \`steelyard tray\` shows why, \`steelyard tray --drop ${shortId(apart[0]!.about)}\` removes ${apart.length === 1 ? 'it' : 'one'}`,
    );
  const kept = outcome.waiting.filter((item) => item.kept).length;
  if (kept > 0) say(`${count(kept)} waiting in the tray (${tray.root}); \`steelyard push\` sends what waits`);
  const lost = outcome.waiting.length - kept + outcome.refused.length - apart.length;
  if (lost > 0) say(`${count(lost)} neither sent nor kept; run it again`);
  if (context.status === EXIT.fine) context.status = EXIT.unsent;
}

export const count = (records: number): string => (records === 1 ? '1 record' : `${records} records`);

function linesOfSent(sent: readonly Sent[], { server }: Settings): string[] {
  const lines = sent.slice(0, LINES_AT_MOST).map(({ about, status, address }) => {
    const page = address === null ? '' : `: ${pageOf(address, server)}`;
    return `pushed ${nameOf(about)}${status === 'known' ? ' (it was there already)' : ''}${page}`;
  });
  return sent.length > LINES_AT_MOST ? [...lines, `and ${count(sent.length - LINES_AT_MOST)} more`] : lines;
}

/** The server may say the whole address or the path alone. */
const pageOf = (address: string, server: string): string =>
  address.startsWith('/') ? server + address : address;

const refusal = (name: string, { project }: Settings, { code, message, ...where }: Fault): Fault => ({
  ...where,
  code: 'PUSH_REFUSED',
  message: `expected project ${project} to take ${name}, found that it is refused (${code}: ${message})`,
});
