import 'server-only';
import { Resend } from 'resend';
import { env } from '../env';

export type Message = {
  to: string;
  subject: string;
  text: string;
  html: string;
  /** the same message is taken once */
  key: string;
};

export type Sent = { ok: true; providerId: string } | { ok: false; trouble: string };

/** Any key will do for the local fake. */
const LOCAL_KEY = 're_local';

/** Gives one message to the service, or to the local fake in its place. */
export async function sendMail({ to, subject, text, html, key }: Message): Promise<Sent> {
  const { mailKey, mailUrl, mailFrom: from } = env();
  if (mailKey === null && mailUrl === null) return { ok: false, trouble: 'No mail service is set up.' };
  const service = mailKey === null ? new Resend(LOCAL_KEY, { baseUrl: mailUrl ?? '' }) : new Resend(mailKey);
  const { data, error } = await service.emails.send(
    { from, to, subject, text, html },
    { idempotencyKey: key },
  );
  if (error) return { ok: false, trouble: error.message };
  return { ok: true, providerId: data.id };
}
