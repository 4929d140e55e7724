import 'server-only';
import { AppError } from '@/lib/errors';
import type { MemberContext, UserContext } from '@/lib/services/context';
import { enterOrganisation } from '@/lib/services/people/enter-organisation';
import { identifyToken } from '@/lib/services/people/identify-token';
import { getServer } from './context';

export interface Caller { user: UserContext; member: MemberContext | null }

/** Who calls: by bearer token, else by session cookie, else nobody. */
export async function identify(headers: Headers): Promise<Caller | null> {
  const { context, sessions } = getServer();
  const authorization = headers.get('authorization');
  if (authorization !== null) {
    const secret = /^Bearer (\S+)$/i.exec(authorization)?.[1];
    if (!secret) throw new AppError('not-signed-in', 'Expected “Authorization: Bearer” and a token.');
    const member = await identifyToken(context, secret);
    return { user: member, member };
  }
  const sessionId = sessions.readCookie(headers.get('cookie') ?? '');
  const session = sessionId === null ? null : await sessions.validate(sessionId);
  if (!session) return null;
  return { user: { ...context, ...session, token: null }, member: null };
}

/** The caller in the organisation asked for; a token implies its own and reaches no other. */
export async function enter(caller: Caller, slug: string | null): Promise<MemberContext> {
  if (!caller.member) return enterOrganisation(caller.user, slug);
  if (slug !== null && slug !== caller.member.organisation.slug) {
    throw new AppError('not-found', 'There is no such organisation, or this token does not belong to it.');
  }
  return caller.member;
}
