'use client';

import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { OrganisationPage } from '@/app/_components/organisation/organisation-page';
import { PageFault } from '@/app/_components/standing/page-fault';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';

export default function OrganisationError({ error }: { error: Error & { digest?: string } }) {
  const { slug } = useOrganisation();
  return (
    <OrganisationPage isFault>
      <Section>
        <PageTitle>This page could not be shown</PageTitle>
        <div className="mt-6"><PageFault error={error} home={`/${slug}`} homeName="Go to the release matrix" /></div>
      </Section>
    </OrganisationPage>
  );
}
