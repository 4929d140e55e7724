'use client';

import { usePathname, useSearchParams } from 'next/navigation';
import { TextLink } from '../ui/text-link';

/** The way through a list that is longer than a page; where one is stands in the address. */
export function PageLinks({ nextCursor }: { nextCursor: string | null }) {
  const path = usePathname();
  const search = useSearchParams();
  const isFirst = !search.has('cursor');
  if (isFirst && nextCursor === null) return null;
  const address = (cursor: string | null) => {
    const parameters = new URLSearchParams(search);
    if (cursor === null) parameters.delete('cursor');
    else parameters.set('cursor', cursor);
    const text = parameters.toString();
    return text === '' ? path : `${path}?${text}`;
  };
  return (
    <nav aria-label="Pages of the list" className="mt-3 flex gap-5">
      {!isFirst && <TextLink href={address(null)}>First page</TextLink>}
      {nextCursor !== null && <TextLink href={address(nextCursor)}>Next page</TextLink>}
    </nav>
  );
}
