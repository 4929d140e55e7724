import type { Metadata } from 'next';
import { AskResetForm } from '@/app/_components/auth/ask-reset-form';
import { SetPasswordForm } from '@/app/_components/auth/set-password-form';
import { single, type SearchParams } from '@/app/_components/lists/list-query';
import { PublicPage } from '@/app/_components/public/public-page';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { TextLink } from '@/app/_components/ui/text-link';

export const metadata: Metadata = { title: 'Set a new password' };

export default async function ResetPasswordPage({ searchParams }: { searchParams: SearchParams }) {
  const token = single((await searchParams).token);
  return (
    <PublicPage title="Set a new password">
      <Section note={<p>You remember it? <TextLink href="/sign-in">Sign in</TextLink></p>}>
        <PageTitle under={token === undefined ? 'A mail brings you a link that sets it.' : 'Every session of the account ends with it.'}>Set a new password</PageTitle>
        <div className="mt-6">{token === undefined ? <AskResetForm /> : <SetPasswordForm token={token} />}</div>
      </Section>
    </PublicPage>
  );
}
