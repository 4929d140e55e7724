'use client';

import { OrganisationPage } from '@/app/_components/organisation/organisation-page';
import { Button } from '@/app/_components/ui/button';
import { Notice } from '@/app/_components/ui/notice';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';

interface OrganisationErrorProps { error: Error & { digest?: string }; reset: () => void }

export default function OrganisationError({ error, reset }: OrganisationErrorProps) {
  return (
    <OrganisationPage>
      <Section>
        <PageTitle>This page could not be shown</PageTitle>
        <div className="mt-6">
          <Notice title="Not shown." actions={<Button kind="primary" onClick={reset}>Try again</Button>}>
            Something went wrong on our side; what was saved before is safe.
            {error.digest && <> If it happens again, quote <code className="font-mono text-code">{error.digest}</code>.</>}
          </Notice>
        </div>
      </Section>
    </OrganisationPage>
  );
}
