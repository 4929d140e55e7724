import type { Role } from '@/lib/domain/people/roles';
import type { Me } from '@/lib/domain/people/schema';
import { createStore } from './create-store';

interface Holder { userId: string; organisation: { id: string; roles: readonly Role[] } }

/** How the rights that this page was opened with have gone; `me` is who is signed in now. */
export type AccessLoss = { kind: 'other-person' | 'removed'; me: Me } | { kind: 'fewer-roles'; me: Me; roles: readonly Role[] };

export const accessLoss = createStore<AccessLoss | null>(null);

/** What somebody can no longer do who could when the page was opened; roles gained are no loss. */
export function lossOf(holder: Holder, me: Me): AccessLoss | null {
  if (me.id !== holder.userId) return { kind: 'other-person', me };
  const present = me.organisations.find(({ id }) => id === holder.organisation.id);
  if (!present) return { kind: 'removed', me };
  return holder.organisation.roles.every((role) => present.roles.includes(role)) ? null : { kind: 'fewer-roles', me, roles: present.roles };
}
