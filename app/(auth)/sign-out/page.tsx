import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { SignOutButton } from '@/app/_components/auth/sign-out-button';
import { PublicPage } from '@/app/_components/public/public-page';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { findVisitor } from '@/app/_server/visit';

export const metadata: Metadata = { title: 'Sign out' };

export default async function SignOutPage() {
  const visitor = await findVisitor();
  if (!visitor) redirect('/');
  return (
    <PublicPage title="Sign out">
      <Section>
        <PageTitle under={`You are signed in as ${visitor.email}.`}>Sign out</PageTitle>
        <SignOutButton>Sign out</SignOutButton>
      </Section>
    </PublicPage>
  );
}
