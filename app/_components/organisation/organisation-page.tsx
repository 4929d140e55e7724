'use client';

import type { ReactNode } from 'react';
import { StandingLine } from '../standing/standing-line';
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
  /** The page itself says what does not answer. */
  isFault?: boolean;
  children: ReactNode;
}

/** A page of an organisation: its bar, then the sections. */
export function OrganisationPage({ place = [], stateLine, isFault, children }: OrganisationPageProps) {
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
  return <Page bar={<>{bar}{!isFault && <StandingLine />}</>} stateLine={stateLine}>{children}</Page>;
}
