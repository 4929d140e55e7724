'use client';

import type { ReactNode } from 'react';
import { Page } from '../ui/page';
import { TopBar, type PlacePart } from '../ui/top-bar';
import { AccountMenu } from './account-menu';
import { useOrganisation } from './organisation-context';
import { sectionLinks } from './section-links';
import { NameLink } from '../ui/text-link';

interface OrganisationPageProps {
  /** Where the page is, below the organisation. */
  place?: readonly PlacePart[];
  stateLine?: ReactNode;
  children: ReactNode;
}

/** A page of an organisation: its bar, then the sections. */
export function OrganisationPage({ place = [], stateLine, children }: OrganisationPageProps) {
  const { slug, name } = useOrganisation();
  const home = `/${slug}`;
  const bar = (
    <TopBar home={home} place={[{ label: name, href: home }, ...place]}>
      <nav aria-label="Sections" className="hidden gap-x-5 wide:flex">
        {sectionLinks(slug).map(({ label, href }) => <NameLink key={href} href={href}>{label}</NameLink>)}
      </nav>
      <AccountMenu />
    </TopBar>
  );
  return <Page bar={bar} stateLine={stateLine}>{children}</Page>;
}
