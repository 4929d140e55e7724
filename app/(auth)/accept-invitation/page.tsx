import type { Metadata } from 'next';
import { QueryProvider } from '@/app/_components/api/query-provider';
import { AcceptInvitation } from '@/app/_components/auth/accept-invitation';
import { single, type SearchParams } from '@/app/_components/lists/list-query';
import { PublicPage } from '@/app/_components/public/public-page';
import { findHome, findVisitor } from '@/app/_server/visit';

export const metadata: Metadata = { title: 'Accept an invitation' };

export default async function AcceptInvitationPage({ searchParams }: { searchParams: SearchParams }) {
  const token = single((await searchParams).token) ?? null;
  const visitor = await findVisitor();
  return (
    <PublicPage title="Accept an invitation" home={await findHome()}>
      <QueryProvider><AcceptInvitation token={token} signedInAs={visitor?.email ?? null} /></QueryProvider>
    </PublicPage>
  );
}
