import type { ReactNode } from 'react';
import { Page } from '../ui/page';
import { NameLink } from '../ui/text-link';
import { TopBar } from '../ui/top-bar';

/** A page that needs no account. */
export function PublicPage({ title, children }: { title?: string; children: ReactNode }) {
  const bar = (
    <TopBar place={title === undefined ? [] : [{ label: title }]}>
      <nav aria-label="Pages" className="flex gap-x-5">
        <NameLink href="/quick-check" className="inline-flex min-h-11 items-center">Quick check</NameLink>
        <NameLink href="/docs/methods" className="hidden min-h-11 items-center tablet:inline-flex">Methods</NameLink>
        <NameLink href="/sign-in" className="inline-flex min-h-11 items-center">Sign in</NameLink>
      </nav>
    </TopBar>
  );
  return <Page bar={bar}>{children}</Page>;
}
