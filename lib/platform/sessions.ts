import { NodePostgresAdapter } from '@lucia-auth/adapter-postgresql';
import { Lucia, TimeSpan } from 'lucia';
import type { Pool } from 'pg';

export interface SessionUser { userId: string; email: string }

/** Cookies are values of a Set-Cookie header. */
export interface Sessions {
  create(userId: string): Promise<string>;
  validate(sessionId: string): Promise<SessionUser | null>;
  end(sessionId: string): Promise<string>;
  /** Ends every session of the person. */
  endAll(userId: string): Promise<string>;
  readCookie(header: string): string | null;
}

/** Sessions in PostgreSQL that end thirty days after their last use; `secure` where the public address is https. */
export function createSessions(pool: Pool, secure: boolean): Sessions {
  const lucia = new Lucia(new NodePostgresAdapter(pool, { user: 'users', session: 'sessions' }), {
    sessionExpiresIn: new TimeSpan(30, 'd'),
    // The row ends the session. A cookie with an end of its own would need sending again from pages, which cannot.
    sessionCookie: { expires: false, name: 'fourfold_session', attributes: { secure, sameSite: 'lax', path: '/' } },
    getUserAttributes: (row) => ({ email: (row as { email: string }).email }),
  });

  return {
    async create(userId) {
      const session = await lucia.createSession(userId, {});
      return lucia.createSessionCookie(session.id).serialize();
    },
    async validate(sessionId) {
      const { session, user } = await lucia.validateSession(sessionId);
      if (!session) return null;
      const email = (user as typeof user & { email: string }).email;
      return { userId: user.id, email };
    },
    async end(sessionId) {
      await lucia.invalidateSession(sessionId);
      return lucia.createBlankSessionCookie().serialize();
    },
    async endAll(userId) {
      await lucia.invalidateUserSessions(userId);
      return lucia.createBlankSessionCookie().serialize();
    },
    readCookie: (header) => lucia.readSessionCookie(header),
  };
}
