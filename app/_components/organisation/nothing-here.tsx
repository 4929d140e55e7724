'use client';

import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { TextLink } from '../ui/text-link';
import { OrganisationPage } from './organisation-page';
import { useOrganisation } from './organisation-context';
import { sectionLinks } from './section-links';

/** An address of the organisation under which nothing stands. */
export function NothingHere() {
  const { slug, name } = useOrganisation();
  return (
    <OrganisationPage place={[{ label: 'not found' }]}>
      <Section>
        <PageTitle>Not found</PageTitle>
        <p className="mt-3">Nothing stands under this address in {name}, or it belongs to another organisation.</p>
        <p className="mt-3 flex flex-wrap gap-x-5 gap-y-2">
          <TextLink href={`/${slug}`}>Release matrix</TextLink>
          {sectionLinks(slug).map(({ label, href }) => <TextLink key={href} href={href}>{label}</TextLink>)}
        </p>
      </Section>
    </OrganisationPage>
  );
}
