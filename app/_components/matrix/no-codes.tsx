'use client';

import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { ButtonLink } from '../ui/button-link';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';

/** The home of an organisation that has no code yet, or of somebody who may see none. */
export function NoCodes() {
  const { slug, name, may, roles } = useOrganisation();
  const mayRead = may('work.read');
  return (
    <OrganisationPage>
      <Section>
        <PageTitle>{name}</PageTitle>
        <div className="mt-6">
          {mayRead
            ? (
              <EmptyState
                needed="Then its releases, a problem it solves, and a case that says what is promised."
                actions={may('work.write') ? <ButtonLink href={`/${slug}/codes`} kind="primary">Make a code</ButtonLink> : undefined}
              >
                The release matrix of a code belongs here. It begins with the code itself.
              </EmptyState>
            )
            : <EmptyState>Signed studies belong here for somebody who is {roles.join(' and ')}. None is signed yet.</EmptyState>}
        </div>
      </Section>
    </OrganisationPage>
  );
}
