import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { SignUpForm } from '@/app/_components/auth/sign-up-form';
import { PublicPage } from '@/app/_components/public/public-page';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { TextLink } from '@/app/_components/ui/text-link';
import { findHome } from '@/app/_server/visit';

export const metadata: Metadata = { title: 'Sign up' };

export default async function SignUpPage() {
  const home = await findHome();
  if (home) redirect(home);
  return (
    <PublicPage title="Sign up">
      <Section note={<><p>You become <b>owner and engineer</b> of the organisation. Nobody outside it sees what is in it.</p><p>You have an account? <TextLink href="/sign-in">Sign in</TextLink></p></>}>
        <PageTitle under="An account for you, and the organisation your codes belong to.">Sign up</PageTitle>
        <div className="mt-6"><SignUpForm /></div>
      </Section>
    </PublicPage>
  );
}
