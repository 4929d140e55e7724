'use client';

import { Button } from './_components/ui/button';
import { ButtonLink } from './_components/ui/button-link';
import { Notice } from './_components/ui/notice';
import { Page } from './_components/ui/page';
import { Section } from './_components/ui/section';
import { TopBar } from './_components/ui/top-bar';

interface ErrorPageProps { error: Error & { digest?: string }; reset: () => void }

export default function ErrorPage({ error, reset }: ErrorPageProps) {
  return (
    <Page bar={<TopBar />}>
      <Section>
        <h1 className="mb-3 font-serif text-title font-semibold">This page could not be shown</h1>
        <Notice
          title="Not shown."
          actions={<><Button kind="primary" onClick={reset}>Try again</Button><ButtonLink href="/">Go to the front page</ButtonLink></>}
        >
          Something went wrong on our side; what was saved before is safe.
          {error.digest && <> If it happens again, quote <code className="font-mono text-code">{error.digest}</code>.</>}
        </Notice>
      </Section>
    </Page>
  );
}
