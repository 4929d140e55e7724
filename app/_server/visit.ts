import 'server-only';
import { cookies, headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { organisationToOpen } from '@/app/_components/organisation/last-organisation';
import { AppError } from '@/lib/errors';
import type { MemberContext, UserContext } from '@/lib/services/context';
import { enterOrganisation } from '@/lib/services/people/enter-organisation';
import { getMe } from '@/lib/services/people/get-me';
import { getServer } from './context';
import { currentRequest } from './request-record';

/** Who looks at the page, or nobody. */
export const findVisitor = cache(async (): Promise<UserContext | null> => {
  const { context, sessions } = getServer();
  const sessionId = sessions.readCookie((await cookies()).toString());
  const session = sessionId === null ? null : await sessions.validate(sessionId);
  if (!session) return null;
  currentRequest().userId = session.userId;
  return { ...context, ...session, token: null };
});

/** The page a visitor starts from; null where nobody is signed in. */
export async function findHome(): Promise<string | null> {
  const visitor = await findVisitor();
  if (!visitor) return null;
  const { organisations } = await getMe(visitor);
  return `/${organisationToOpen(organisations, (await cookies()).toString())?.slug ?? 'account'}`;
}

/** The visitor as a member of the organisation of the page; others are sent to sign in, or find nothing here. */
export const requireMember = cache(async (slug: string): Promise<MemberContext> => {
  const visitor = await findVisitor();
  if (!visitor) redirect(`/sign-in?next=${encodeURIComponent((await headers()).get('x-fourfold-path') ?? `/${slug}`)}`);
  const member = await orNotFound(enterOrganisation(visitor, slug));
  currentRequest().organisationId = member.organisation.id;
  return member;
});

/** What a service gives; where it finds nothing, the page is the one of an unknown address. */
export async function orNotFound<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError && error.code === 'not-found') notFound();
    throw error;
  }
}
