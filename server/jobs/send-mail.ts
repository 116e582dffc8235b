import type { MailTransport } from '../mail/transport.ts';
import { Mail } from '../models/index.ts';
import type { MailJob } from './queues.ts';

/** Sends one letter of the outbox; a failure is noted and thrown, so that the queue tries again. */
export async function sendMailJob({ mail: id }: MailJob, transport: MailTransport): Promise<void> {
  const mail = await Mail.findByPk(id);
  if (!mail || mail.sentAt) return;
  try {
    await transport.send({
      id: String(mail.id),
      to: mail.recipient,
      subject: mail.subject,
      text: mail.text,
      headers: mail.headers,
    });
  } catch (error) {
    await mail.update({ failure: error instanceof Error ? error.message : String(error) });
    throw error;
  }
  // Links in it are secrets: what is sent is not kept.
  await mail.update({ sentAt: new Date(), failure: null, text: '', headers: {} });
}
