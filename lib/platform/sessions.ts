import { NodePostgresAdapter } from '@lucia-auth/adapter-postgresql';
import { Lucia, TimeSpan } from 'lucia';
import type { Pool } from 'pg';

export interface SessionUser { userId: string; email: string }

/** Cookies are values of a Set-Cookie header. */
export interface Sessions {
  create(userId: string): Promise<string>;
  /** `renewed` is set where the cookie's life was prolonged and must be sent again. */
  validate(sessionId: string): Promise<{ user: SessionUser; renewed: string | null } | null>;
  end(sessionId: string): Promise<string>;
  readCookie(header: string): string | null;
}

/** Sessions of thirty days in PostgreSQL; `secure` where the public address is https. */
export function createSessions(pool: Pool, secure: boolean): Sessions {
  const lucia = new Lucia(new NodePostgresAdapter(pool, { user: 'users', session: 'sessions' }), {
    sessionExpiresIn: new TimeSpan(30, 'd'),
    sessionCookie: { name: 'fourfold_session', attributes: { secure, sameSite: 'lax', path: '/' } },
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
      return { user: { userId: user.id, email }, renewed: session.fresh ? lucia.createSessionCookie(session.id).serialize() : null };
    },
    async end(sessionId) {
      await lucia.invalidateSession(sessionId);
      return lucia.createBlankSessionCookie().serialize();
    },
    readCookie: (header) => lucia.readSessionCookie(header),
  };
}
