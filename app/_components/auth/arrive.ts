import type { Me } from '@/lib/domain/people/schema';

/** An address of this site that `next` may lead to; anything else is nobody's. */
export function ownAddress(next: string | undefined): string | null {
  return next !== undefined && /^\/(?![/\\])/.test(next) ? next : null;
}

/** Where somebody who signed in goes on: where they wanted to, else their first organisation. */
export function arrivalAddress(me: Me, next: string | null): string {
  return next ?? `/${me.organisations[0]?.slug ?? ''}`;
}
