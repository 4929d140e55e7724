import type { ReactNode } from 'react';
import { Page } from '../ui/page';
import { NameLink } from '../ui/text-link';
import { TopBar } from '../ui/top-bar';

interface PublicPageProps {
  title?: string;
  /** Where somebody already signed in goes on. */
  home?: string | null;
  children: ReactNode;
}

const link = 'min-h-11 items-center';

/** A page that needs no account. */
export function PublicPage({ title, home, children }: PublicPageProps) {
  const bar = (
    <TopBar place={title === undefined ? [] : [{ label: title }]}>
      <nav aria-label="Pages" className="flex gap-x-5">
        <NameLink href="/quick-check" className={`inline-flex ${link}`}>Quick check</NameLink>
        <NameLink href="/docs/methods" className={`hidden tablet:inline-flex ${link}`}>Methods</NameLink>
        <NameLink href={home ?? '/sign-in'} className={`inline-flex ${link}`}>{home ? 'Your organisation' : 'Sign in'}</NameLink>
      </nav>
    </TopBar>
  );
  return <Page bar={bar}>{children}</Page>;
}
