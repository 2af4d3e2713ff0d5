'use server';

import type { Route } from 'next';
import { redirect } from 'next/navigation';
import { z } from 'zod';
import { lengthText } from '@/src/schedule/words';
import { signIn as startLogin, signOut as endLogin } from '@/src/viewer/login';
import { safeReturnPath } from '@/src/viewer/return-path';

export type SignInState = {
  ok: false;
  code: 'invalid';
  message: string;
  advice?: string;
  fields?: { email?: string[]; password?: string[] };
  /** what was typed, to be kept */
  email: string;
} | null;

const schema = z.object({
  email: z
    .string()
    .trim()
    .min(1, { error: 'Enter your e-mail.', abort: true })
    .max(254, 'An e-mail has at most 254 characters.')
    .regex(/^[^\s@]+@[^\s@]+$/, 'An e-mail has the form name@place.'),
  password: z.string().min(1, 'Enter your password.').max(256, 'A password has at most 256 characters.'),
});

export async function signIn(_: SignInState, form: FormData): Promise<SignInState> {
  const typed = form.get('email');
  const email = typeof typed === 'string' ? typed.slice(0, 254) : '';
  const parsed = schema.safeParse({ email: typed ?? '', password: form.get('password') ?? '' });
  if (!parsed.success) {
    const { fieldErrors: fields } = z.flattenError(parsed.error);
    return { ok: false, code: 'invalid', message: 'Look at what is said below.', fields, email };
  }
  const answer = await startLogin(parsed.data.email, parsed.data.password);
  if (!answer.ok) {
    if (answer.reason === 'mismatch') {
      const advice = 'Check both, or ask an administrator for a new password.';
      return { ok: false, code: 'invalid', message: 'That e-mail and password do not match.', advice, email };
    }
    const message = `Too many tries. Try again in ${lengthText(answer.waitSeconds)}.`;
    return { ok: false, code: 'invalid', message, email };
  }
  redirect(safeReturnPath(form.get('next')) as Route);
}

export async function signOut(): Promise<void> {
  await endLogin();
  redirect('/sign-in' as Route);
}
