import type { Me } from '@/lib/domain/people/schema';
import { organisationToOpen } from '../organisation/last-organisation';

/** An address of this site that `next` may lead to; anything else is nobody's. */
export function ownAddress(next: string | undefined): string | null {
  return next !== undefined && /^\/(?![/\\])/.test(next) ? next : null;
}

/** Where somebody who signed in goes on: where they wanted to, else the organisation of last time, else their account. */
export function arrivalAddress(me: Me, next: string | null): string {
  return next ?? `/${organisationToOpen(me.organisations, document.cookie)?.slug ?? 'account'}`;
}
