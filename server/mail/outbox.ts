import type { Transaction } from 'sequelize';
import type { Deps } from '../deps.ts';
import { MAIL_QUEUE, sendJob } from '../jobs/queues.ts';
import { Mail } from '../models/index.ts';

export interface Letter {
  readonly to: string;
  readonly subject: string;
  /** Paragraphs. */
  readonly text: readonly string[];
  /** Where one click stops such mail; absent for mail that was asked for. */
  readonly stop?: string;
}

/** Puts a letter into the outbox, in the transaction of what it tells of; a job sends it. */
export async function post(letter: Letter, { boss, config }: Deps, transaction: Transaction): Promise<void> {
  const foot = letter.stop
    ? [
        `You get this because of your choices on ${config.PUBLIC_URL}/account. To stop all such mail: ${letter.stop}`,
      ]
    : [];
  const mail = await Mail.create(
    {
      recipient: letter.to,
      subject: letter.subject,
      text: [...letter.text, ...foot, '-- \nSteelyard'].join('\n\n'),
      headers: letter.stop
        ? {
            'List-Unsubscribe': `<${letter.stop.replace('/mail-stop/', '/api/mail-stops/')}>`,
            'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
          }
        : {},
    },
    { transaction },
  );
  await sendJob(boss, MAIL_QUEUE, { mail: mail.id }, transaction);
}
