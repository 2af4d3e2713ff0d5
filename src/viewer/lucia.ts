import 'server-only';
import { DrizzleSQLiteAdapter } from '@lucia-auth/adapter-drizzle';
import { Lucia, TimeSpan } from 'lucia';
import { db } from '../../db/client';
import { loginSessions } from '../../db/schema/login-sessions';
import { users } from '../../db/schema/users';
import { env } from '../env';
import type { Viewer } from '../access/policy';

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof build>;
    DatabaseUserAttributes: {
      email: string;
      passwordHash: string;
      theme: Viewer['theme'];
      isDemo: boolean;
    };
  }
}

function build() {
  return new Lucia(new DrizzleSQLiteAdapter(db(), loginSessions, users), {
    sessionExpiresIn: new TimeSpan(26, 'h'),
    sessionCookie: {
      name: 'antiphon_login',
      // The row in the table ends a login; a page may extend it there, but no page can set a cookie.
      expires: false,
      attributes: { secure: env().isCookieSecure, sameSite: 'lax', path: '/' },
    },
    getUserAttributes: ({ email, theme, isDemo }) => ({ email, theme, isDemo }),
  });
}

let instance: ReturnType<typeof build> | undefined;
export const lucia = () => (instance ??= build());
