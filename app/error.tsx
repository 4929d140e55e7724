'use client';

import { PageFault } from './_components/standing/page-fault';
import { Page } from './_components/ui/page';
import { PageTitle } from './_components/ui/page-title';
import { Section } from './_components/ui/section';
import { TopBar } from './_components/ui/top-bar';

export default function ErrorPage({ error }: { error: Error & { digest?: string } }) {
  return (
    <Page bar={<TopBar />}>
      <Section>
        <PageTitle>This page could not be shown</PageTitle>
        <div className="mt-6"><PageFault error={error} home="/" homeName="Go to the front page" /></div>
      </Section>
    </Page>
  );
}
