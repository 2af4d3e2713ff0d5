import 'server-only';
import { z } from 'zod';
import { can, type Viewer } from '../../access/policy';
import { env } from '../../env';
import { answer, forbiddenFor, type Failure } from '../errors';

export type LocalMessage = {
  id: string;
  to: string[];
  from: string;
  subject: string;
  text: string;
  html: string;
};

export type Mailbox =
  | { ok: true; isUp: true; messages: LocalMessage[] }
  /** mail goes out for real, the fake does not answer, or there is neither */
  | { ok: true; isUp: false; why: 'real' | 'silent' | 'none' };

const outbox = z.object({
  messages: z.array(
    z.object({
      id: z.string(),
      to: z.array(z.string()),
      from: z.string(),
      subject: z.string(),
      text: z.string(),
      html: z.string(),
    }),
  ),
});

/** What the local fake of the mail service took, newest first. */
export const readMailbox = (viewer: Viewer): Promise<Mailbox | Failure> =>
  answer(async () => {
    if (!can(viewer, 'mail.read')) throw forbiddenFor('mail.read');
    const { isDemo, mailKey, mailUrl } = env();
    if (mailKey !== null) return { ok: true, isUp: false, why: 'real' };
    if (!isDemo) return { ok: true, isUp: false, why: 'none' };
    const text = mailUrl === null ? null : await fetchOutbox(mailUrl);
    if (text === null) return { ok: true, isUp: false, why: 'silent' };
    return { ok: true, isUp: true, messages: outbox.parse(JSON.parse(text)).messages };
  });

async function fetchOutbox(mailUrl: string): Promise<string | null> {
  try {
    const response = await fetch(`${mailUrl}/outbox`, { cache: 'no-store' });
    return await response.text();
  } catch (error) {
    if (error instanceof TypeError) return null;
    throw error;
  }
}
