import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { HydrationBoundary } from '@tanstack/react-query';
import { AccountView } from '@/app/_components/account/account-view';
import { QueryProvider } from '@/app/_components/api/query-provider';
import { PublicPage } from '@/app/_components/public/public-page';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { findHome, findVisitor } from '@/app/_server/visit';
import { getMailPreferencesContract } from '@/lib/domain/people/account-schema';
import { getMailPreferences } from '@/lib/services/account/get-mail-preferences';
import { getMe } from '@/lib/services/people/get-me';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const visitor = await findVisitor();
  if (!visitor) redirect('/sign-in?next=/account');
  const state = await prefetch(answerOf(getMailPreferencesContract, {}, getMailPreferences(visitor)));
  return (
    <PublicPage title="Account" home={await findHome()}>
      <QueryProvider><HydrationBoundary state={state}><AccountView me={await getMe(visitor)} /></HydrationBoundary></QueryProvider>
    </PublicPage>
  );
}
