import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { ownAddress } from '@/app/_components/auth/arrive';
import { SignInForm } from '@/app/_components/auth/sign-in-form';
import { PublicPage } from '@/app/_components/public/public-page';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { TextLink } from '@/app/_components/ui/text-link';
import { findHome } from '@/app/_server/visit';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ next?: string | string[] }> }) {
  const { next } = await searchParams;
  const wanted = ownAddress(typeof next === 'string' ? next : undefined);
  const home = await findHome();
  if (home) redirect(wanted ?? home);
  return (
    <PublicPage title="Sign in">
      <Section note={<><p>Somebody new starts with <TextLink href="/sign-up">an account and its organisation</TextLink>.</p><p><TextLink href="/reset-password">Password forgotten?</TextLink></p></>}>
        <PageTitle under={wanted ? 'The page you asked for is shown after signing in.' : undefined}>Sign in</PageTitle>
        <div className="mt-6"><SignInForm next={wanted} /></div>
      </Section>
    </PublicPage>
  );
}
